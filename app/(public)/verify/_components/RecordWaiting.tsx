"use client";
import { useRouter } from "next/navigation";
import { useEffect } from "react";
import { Working } from "@/components/ui/Working";

const AGAIN_MS = 3000;

/** Looks again until the record is signed; without scripts the person loads the page again. */
export function RecordWaiting() {
  const router = useRouter();
  useEffect(() => {
    const timer = setInterval(() => router.refresh(), AGAIN_MS);
    return () => clearInterval(timer);
  }, [router]);
  return (
    <Working label="The record is being signed">
      <noscript>Load this page again in a moment.</noscript>
    </Working>
  );
}

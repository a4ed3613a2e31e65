"use client";
import { useEffect, useState } from "react";

const SETTLED_MS = 400;

/** What a screen reader hears: the reading once it has stood still, so that a held key does not flood it. */
export function useSpoken(reading: string): string {
  const [spoken, setSpoken] = useState("");
  useEffect(() => {
    const timer = setTimeout(() => setSpoken(reading), SETTLED_MS);
    return () => clearTimeout(timer);
  }, [reading]);
  return spoken;
}

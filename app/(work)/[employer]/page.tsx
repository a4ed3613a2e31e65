import { redirect } from "next/navigation";
import { requireActor } from "@/lib/auth/requireActor";
import { homeOf } from "@/lib/policies/stations";

/** An employer's address alone leads to where the person begins. */
export default async function EmployerPage({ params }: { params: Promise<{ employer: string }> }) {
  redirect(homeOf(await requireActor((await params).employer)));
}

import type { Metadata } from "next";
import { Bench } from "./_components/Bench";

export const metadata: Metadata = {
  title: "Bench",
  description: "Calculators for receiver work, on the same engine the checks are marked with.",
};

type Search = Record<string, string | string[] | undefined>;

export default async function BenchPage({ searchParams }: { searchParams: Promise<Search> }) {
  const asked = Object.entries(await searchParams).flatMap(([name, value]) =>
    typeof value === "string" ? [[name, value]] : [],
  );
  return <Bench asked={new URLSearchParams(asked).toString()} />;
}

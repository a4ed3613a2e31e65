import { StatusHead } from "@/components/ui/StatusHead";
import { NumberForm } from "./NumberForm";

type NoAnswerProps = { title?: string; standing?: "cannot-be-told"; typed: string; error?: string };

/** No entry to show: why, and the field again with what was typed. */
export function NoAnswer({ title, standing, typed, error }: NoAnswerProps) {
  return (
    <div className="page py-10">
      {standing ? (
        <>
          <StatusHead standing={standing} />
          <p className="mt-6 max-w-measure text-lead">
            The register could not be reached, so nothing is said about this certificate. Do not take it as valid. Try
            again in a minute.
          </p>
        </>
      ) : (
        <h1 className="text-h1">{title}</h1>
      )}
      <div className="mt-8 max-w-[560px]">
        <NumberForm value={typed} error={error} />
      </div>
    </div>
  );
}

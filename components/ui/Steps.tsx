import Link from "next/link";

export type Step = { id: string; label: string; state: "done" | "current" | "todo" | "awaiting"; href?: string };

/** Steps of one thing on the line: done stands in ink (or blue, for an issue), the current one in blue, what comes is a tick. */
export function Steps({
  label,
  steps,
  tone = "ink",
}: {
  label: string;
  steps: readonly Step[];
  tone?: "ink" | "plus";
}) {
  return (
    <ol className="steps" aria-label={label}>
      {steps.map((step) => (
        <li
          key={step.id}
          className="step"
          data-state={step.state}
          aria-current={step.state === "current" ? "step" : undefined}
        >
          <span className="step-block" data-tone={tone} aria-hidden />
          {step.href ? <Link href={step.href}>{step.label}</Link> : step.label}
          {step.state === "done" && <span className="sr-only">, done</span>}
        </li>
      ))}
    </ol>
  );
}

/** The same steps at the foot of a phone or tablet, as targets. Without `onGo` they are links. */
export function FootSteps({
  label,
  steps,
  onGo,
}: {
  label: string;
  steps: readonly Step[];
  onGo?: (id: string) => void;
}) {
  return (
    <nav className="foot-steps" aria-label={label}>
      {steps.map((step) => {
        const current = step.state === "current" ? ("step" as const) : undefined;
        return onGo ? (
          <button
            key={step.id}
            type="button"
            className="foot-step"
            aria-current={current}
            onClick={() => onGo(step.id)}
          >
            {step.label}
          </button>
        ) : (
          <Link key={step.id} href={step.href ?? "#"} className="foot-step" aria-current={current}>
            {step.label}
          </Link>
        );
      })}
    </nav>
  );
}

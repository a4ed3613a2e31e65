import { SectionHead } from "@/components/ui/SectionHead";
import type { PublicVerification } from "@/lib/queries/getPublicVerification";

/** Names of the quantities with their tolerances; what was measured stays between holder and issuer. */
export function MeasuredQuantities({ quantities }: { quantities: PublicVerification["quantities"] }) {
  const checks = [...new Set(quantities.map(({ check }) => check))];
  return (
    <section className="mt-8" aria-labelledby="measured">
      <SectionHead title="What was measured" id="measured" note="Quantity and tolerance; computed by the server" />
      <div className="mt-1 grid gap-x-8 tablet:grid-cols-2">
        {checks.map((check) => {
          const own = quantities.filter((quantity) => quantity.check === check);
          return (
            <div key={check} className="py-3">
              <h3 className="text-dense font-semibold">{own[0]!.title}</h3>
              <dl>
                {own.map((quantity) => (
                  <div
                    key={quantity.label}
                    className="flex justify-between gap-4 border-b-hair border-rule py-1.5 text-dense"
                  >
                    <dt>{quantity.label}</dt>
                    <dd className="text-right text-ink-2 figures">
                      {quantity.tolerance}
                      {quantity.critical && ", critical"}
                    </dd>
                  </div>
                ))}
              </dl>
            </div>
          );
        })}
      </div>
    </section>
  );
}

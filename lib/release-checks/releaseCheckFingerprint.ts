import { fingerprintOf } from "@/lib/certificates/canonicalJson";
import { ENGINE_VERSION } from "@/lib/checks/engineVersion";
import type { CheckPlan } from "@/lib/checks/kind";
import { RELEASE_CHECK_VERSION } from "@/lib/checks/release-check/rule";

/**
 * Of all that a check's table follows from: two checks that differ in name, title or minutes alone have one. It is also the base
 * that the seeds of the tried cases are drawn from, so that nobody chooses them.
 */
export const releaseCheckFingerprint = ({ kind, version, parameters, quantities, needs }: CheckPlan): string =>
  fingerprintOf({
    schema: `lagmark-release-check-${RELEASE_CHECK_VERSION}`,
    engine: ENGINE_VERSION,
    ...{ kind, version, parameters, quantities, needs },
  });

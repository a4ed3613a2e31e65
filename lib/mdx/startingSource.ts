/** What a new module begins with: every line of front matter that a release needs, and one check to try. */
export const startingSource = (code: string, title: string): string => `---
code: ${code}
title: ${JSON.stringify(title)}
scope: Say which receivers, sites and signals this covers
limits: Receive only. Not for safety-of-life use.
edition: Say the scheme or standard and its edition
valid: { months: 36, reason: Say why this interval }
supervision: open
aids: [bench]
sitting: { days: 30, freshCases: 1, waitHours: 24 }
require:
  all: [reading]
---

# ${title}

Write here what your technicians do, step by step.

<Caution about="transmit" />

<Check id="reading" kind="correlator-reading" minutes={15}>
Read the correlator of the receiver.
</Check>
`;

/** A module of two checks without a fault. */
export const TWO_CHECKS = `---
code: TWO-1
title: List and prove
scope: GPS L1 C/A
limits: Receive only.
edition: written to the firm's procedure 7
valid: { months: 36, reason: receiver families change slowly }
supervision: open
aids: [bench]
sitting: { days: 30, freshCases: 1, waitHours: 24 }
require: { all: [list, lock] }
---

# Two checks

<Check id="list" kind="satellites" minutes={40}>
List them.
</Check>

<Check id="lock" kind="false-lock" minutes={45}>
Prove them.
</Check>
`;

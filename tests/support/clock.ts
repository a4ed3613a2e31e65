/** Every test's present. Commands take it as an argument, so that no test depends on the day it runs. */
export const NOW = new Date("2026-12-01T10:00:00.000Z");

export const minutesFrom = (at: Date, minutes: number): Date => new Date(at.getTime() + minutes * 60_000);
export const daysFrom = (at: Date, days: number): Date => minutesFrom(at, days * 1440);

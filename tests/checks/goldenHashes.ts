export const GOLDEN = {
  correlatorReading: [],
  searchPlan: [],
  satelliteScenes: [],
  satelliteCaptures: [],
  falseLockScenes: [],
  falseLockCaptures: [],
} as Record<string, string[]>;

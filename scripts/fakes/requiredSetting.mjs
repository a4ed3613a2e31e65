/** A setting of a stand-in; it is started by scripts, which always give it. */
export function requiredSetting(name) {
  const value = process.env[name];
  if (!value) throw new Error(`${name} is not set`);
  return value;
}

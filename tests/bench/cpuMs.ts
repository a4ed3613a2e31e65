/** Time that this process has computed, ms: what others do on the machine in the meantime is not in it. */
export function cpuMs(): number {
  const { user, system } = process.cpuUsage();
  return (user + system) / 1000;
}

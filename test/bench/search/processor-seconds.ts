/** Processor seconds this process and its threads took: other work on the machine costs them little. */
export function processorSeconds(run: () => unknown): number {
  const before = process.cpuUsage()
  run()
  const { user, system } = process.cpuUsage(before)
  return (user + system) / 1e6
}

import { readFileSync } from 'node:fs';

/** Processor time that this process takes for some work, in seconds, all its threads together. */
export async function cpuSeconds(work: () => Promise<unknown>): Promise<number> {
  const from = process.cpuUsage();
  await work();
  const { user, system } = process.cpuUsage(from);
  return (user + system) / 1e6;
}

/** The kernel counts processor time in hundredths of a second. */
const ticksASecond = 100;

/** Where the figures stand in /proc/PID/stat, counted from behind the name: a process's own time, and that of children that ended. */
const fields = { own: [11, 12], ended: [13, 14] } as const;

/** Processor time of another process so far, or of all children of it that have ended, in seconds. Linux only. */
export function cpuOf(process: number | 'self', whose: keyof typeof fields = 'own'): number {
  const stat = readFileSync(`/proc/${process}/stat`, 'utf8').split(') ')[1]?.split(' ') ?? [];
  return fields[whose].reduce((sum, at) => sum + Number(stat[at] ?? 0), 0) / ticksASecond;
}

/** Processor time that everything on the machine has taken so far, in seconds: all but idling and waiting. Linux only. */
export function machineCpu(): number {
  const [all = ''] = readFileSync('/proc/stat', 'utf8').split('\n');
  const [user = 0, nice = 0, system = 0, , , irq = 0, softIrq = 0] = all.trim().split(/\s+/).slice(1).map(Number);
  return (user + nice + system + irq + softIrq) / ticksASecond;
}

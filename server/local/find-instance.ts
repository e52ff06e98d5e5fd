import { readdirSync, readFileSync } from 'node:fs';

/** A running MariaDB server of ours. */
export interface Instance {
  readonly pid: number;
  readonly port: number;
  readonly socket: string;
}

/** The MariaDB server that runs on this folder, found by its command line, so that no stale file can mislead. */
export function findInstance(dataFolder: string): Instance | undefined {
  for (const entry of readdirSync('/proc')) {
    if (!/^\d+$/.test(entry)) continue;
    const pid = Number(entry);
    if (!isDatabaseServer(pid)) continue;
    const args = readArguments(pid);
    const read = (name: string) => args.find((arg) => arg.startsWith(`--${name}=`))?.slice(name.length + 3);
    if (read('datadir') !== dataFolder) continue;
    const socket = read('socket');
    const port = Number(read('port'));
    if (socket !== undefined && port > 0) return { pid, port, socket };
  }
  return undefined;
}

/** Whether the process is alive and a MariaDB server; a process that has ended but is not yet collected is not. */
export function isDatabaseServer(pid: number): boolean {
  const stat = readProcessFile(pid, 'stat');
  if (stat === undefined) return false;
  const name = stat.slice(stat.indexOf('(') + 1, stat.lastIndexOf(')'));
  const state = stat.slice(stat.lastIndexOf(')') + 2, stat.lastIndexOf(')') + 3);
  return name === 'mariadbd' && state !== 'Z';
}

/** When a process started, in the kernel's clock ticks; tells two processes with the same number apart. */
export function readStartTime(pid: number): string | undefined {
  const stat = readProcessFile(pid, 'stat');
  return stat?.slice(stat.lastIndexOf(')') + 2).split(' ')[19];
}

function readArguments(pid: number): readonly string[] {
  return (readProcessFile(pid, 'cmdline') ?? '').split('\0');
}

// A process may end between being listed and being read; that is an answer, not an error.
function readProcessFile(pid: number, name: string): string | undefined {
  try {
    return readFileSync(`/proc/${pid}/${name}`, 'utf8');
  } catch (error) {
    const { code } = error as NodeJS.ErrnoException;
    if (code === 'ENOENT' || code === 'ESRCH' || code === 'EACCES') return undefined;
    throw error;
  }
}

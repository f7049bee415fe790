/**
 * A private Slurm on this one machine, bound to loopback, for the time of a test: its own key, ports, folders and daemons, started
 * and ended by process id. Needs munged, slurmctld, slurmd, and a host name that resolves to 127.x.
 */
import { spawnSync } from 'node:child_process';
import { chmodSync, existsSync, mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { hostname, userInfo } from 'node:os';
import { join } from 'node:path';

/** A cluster that runs. */
export interface PrivateSlurm {
  /** Environment in which `sbatch` and its kin speak to it. */
  readonly env: NodeJS.ProcessEnv;
  /** Runs a client command; its standard output. Throws with its complaint where it fails. */
  run(command: string, ...args: readonly string[]): string;
  /** Cancels all jobs and ends all daemons. */
  stop(): Promise<void>;
}

const PATH = `${process.env.PATH ?? ''}:/usr/sbin:/sbin`;
const DAEMONS = ['munged', 'mungekey', 'slurmctld', 'slurmd', 'sbatch', 'squeue', 'sinfo', 'scontrol', 'scancel'];

/** Why no private Slurm can run here; empty where one can. */
export function whyNoSlurm(): string {
  const missing = DAEMONS.filter((name) => !PATH.split(':').some((folder) => existsSync(join(folder, name))));
  if (missing.length > 0) return `needs ${missing.join(', ')} (Debian: slurm-wlm munge)`;
  const address = spawnSync('getent', ['ahostsv4', shortName()], { encoding: 'utf8' }).stdout;
  return /^127\./m.test(address) ? '' : 'needs a host name that resolves to 127.x';
}

/** Starts a cluster of `nodes` one-core nodes in the empty folder `base`. */
export async function startSlurm(base: string, nodes: number): Promise<PrivateSlurm> {
  const port = 20_000 + (process.pid % 20_000);
  for (const name of ['run', 'log', 'etc', 'state']) mkdirSync(join(base, name), { recursive: true });
  const conf = join(base, 'etc', 'slurm.conf');
  writeFileSync(conf, configuration(base, nodes, port));
  const env = { ...process.env, PATH, SLURM_CONF: conf };
  const run = (command: string, ...args: readonly string[]): string => client(env, command, args);
  startMunge(env, base);
  run('slurmctld', '-f', conf);
  for (let node = 1; node <= nodes; node++) run('slurmd', '-N', `n${node}`, '-f', conf);
  await waitFor(
    () =>
      (attempt(() => run('sinfo', '-h', '-N', '-o', '%t')) ?? '').split('\n').filter((t) => t === 'idle').length ===
      nodes,
  );
  return { env, run, stop: () => stopSlurm(base, run) };
}

/** Waits until `ready`, at most eight minutes. */
export async function waitFor(ready: () => boolean): Promise<void> {
  for (let i = 0; i < 4800; i++) {
    if (ready()) return;
    await new Promise((done) => setTimeout(done, 100));
  }
  throw new Error('the cluster did not get there within eight minutes');
}

function startMunge(env: NodeJS.ProcessEnv, base: string): void {
  const key = join(base, 'etc', 'munge.key');
  client(env, 'mungekey', ['--create', `--keyfile=${key}`, '--bits=1024']);
  chmodSync(key, 0o600);
  client(env, 'munged', [
    `--key-file=${key}`,
    `--socket=${join(base, 'run', 'munge.socket')}`,
    `--pid-file=${join(base, 'run', 'munged.pid')}`,
    `--log-file=${join(base, 'log', 'munged.log')}`,
    `--seed-file=${join(base, 'state', 'munged.seed')}`,
    '--force',
  ]);
}

async function stopSlurm(base: string, run: PrivateSlurm['run']): Promise<void> {
  // slurmd leaves jobs running when it stops, so they go first.
  attempt(() => run('scancel', '--user', userInfo().username));
  attempt(() => waitFor(() => run('squeue', '-h').trim() === ''));
  const files = readdirSync(join(base, 'run')).filter((name) => name.endsWith('.pid'));
  const order = (name: string): number => (name.startsWith('slurmd') ? 0 : name.startsWith('slurmctld') ? 1 : 2);
  const pids = files
    .sort((a, b) => order(a) - order(b))
    .map((name) => Number(readFileSync(join(base, 'run', name), 'utf8')));
  for (const pid of pids) attempt(() => process.kill(pid, 'SIGTERM'));
  await waitFor(() => !pids.some(isAlive));
  rmSync(base, { recursive: true, force: true, maxRetries: 5 });
}

// Under a container's first process a dead daemon can stay a zombie, so signal 0 alone does not tell.
function isAlive(pid: number): boolean {
  const status = attempt(() => readFileSync(`/proc/${pid}/status`, 'utf8'));
  return status !== undefined && !/^State:\s+[ZX]/m.test(status);
}

function client(env: NodeJS.ProcessEnv, command: string, args: readonly string[]): string {
  const done = spawnSync(command, args, { env, encoding: 'utf8' });
  if (done.status !== 0) throw new Error(`${command}: ${done.stderr}${done.error?.message ?? ''}`);
  return done.stdout;
}

function attempt<T>(work: () => T): T | undefined {
  try {
    return work();
  } catch {
    return undefined;
  }
}

function shortName(): string {
  return hostname().split('.')[0] ?? '';
}

function configuration(base: string, nodes: number, port: number): string {
  const user = userInfo().username;
  const at = (...names: string[]): string => join(base, ...names);
  const lines = [
    'ClusterName=private',
    `SlurmctldHost=${shortName()}(127.0.0.1)`,
    `SlurmctldPort=${port}`,
    `SlurmUser=${user}`,
    `SlurmdUser=${user}`,
    'CommunicationParameters=NoInAddrAny,NoCtldInAddrAny',
    'AuthType=auth/munge',
    `AuthInfo=socket=${at('run', 'munge.socket')}`,
    'CredType=cred/munge',
    `StateSaveLocation=${at('state', 'slurmctld')}`,
    `SlurmdSpoolDir=${at('state', 'slurmd.%n')}`,
    `SlurmctldPidFile=${at('run', 'slurmctld.pid')}`,
    `SlurmdPidFile=${at('run', 'slurmd.%n.pid')}`,
    `SlurmctldLogFile=${at('log', 'slurmctld.log')}`,
    `SlurmdLogFile=${at('log', 'slurmd.%n.log')}`,
    'ProctrackType=proctrack/linuxproc',
    'TaskPlugin=task/none',
    'SwitchType=switch/none',
    'MpiDefault=none',
    'MailProg=/bin/true',
    'JobAcctGatherType=jobacct_gather/none',
    'AccountingStorageType=accounting_storage/none',
    'SchedulerType=sched/backfill',
    'SchedulerParameters=batch_sched_delay=0,sched_min_interval=0',
    'SelectType=select/cons_tres',
    'SelectTypeParameters=CR_CPU',
    'JobRequeue=1',
    'RequeueExit=75',
    'KillWait=5',
    'ReturnToService=2',
    ...Array.from({ length: nodes }, (_, i) => {
      return `NodeName=n${i + 1} NodeHostname=${shortName()} NodeAddr=127.0.0.1 Port=${port + i + 1} CPUs=1 State=UNKNOWN`;
    }),
    `PartitionName=batch Nodes=n[1-${nodes}] Default=YES MaxTime=INFINITE State=UP`,
  ];
  return `${lines.join('\n')}\n`;
}

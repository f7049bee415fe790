/** Which shard a task of an array job is: read from the variable that its scheduler sets. */

/** A scheduler's index variable and the number it counts from. */
interface IndexVariable {
  readonly name: string;
  readonly first: number;
}

/** Slurm, Kubernetes Indexed Job, AWS Batch, LSF, PBS. */
const VARIABLES: readonly IndexVariable[] = [
  { name: 'SLURM_ARRAY_TASK_ID', first: 0 },
  { name: 'JOB_COMPLETION_INDEX', first: 0 },
  { name: 'AWS_BATCH_JOB_ARRAY_INDEX', first: 0 },
  { name: 'LSB_JOBINDEX', first: 1 },
  { name: 'PBS_ARRAY_INDEX', first: 1 },
];

/** Names of the variables that are looked at, in order. */
export const INDEX_VARIABLES: readonly string[] = VARIABLES.map((variable) => variable.name);

/**
 * The shard that the environment names, from 0; undefined where no scheduler has set an index. `first` is the number that the
 * job's indices count from, where that is not the scheduler's habit.
 */
export function shardFromEnvironment(env: NodeJS.ProcessEnv, first?: number): number | undefined {
  for (const variable of VARIABLES) {
    const text = env[variable.name] ?? '';
    if (/^\d+$/.test(text)) return Number(text) - (first ?? variable.first);
  }
  return undefined;
}

/** Name of a shard's folder inside the folder of the whole sweep. */
export function shardFolder(shard: number): string {
  return `shard-${String(shard).padStart(5, '0')}`;
}

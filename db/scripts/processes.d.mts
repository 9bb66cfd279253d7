import type { ChildProcess, SpawnOptions } from 'node:child_process';

export function startGroup(command: string, args: readonly string[], options?: SpawnOptions): ChildProcess;
export function exitCodeOf(child: ChildProcess): Promise<number>;
export function stopGroup(child: ChildProcess, graceMs?: number): Promise<void>;
export function runGroup(command: string, args: readonly string[], options?: SpawnOptions): Promise<number>;
export function stopEverythingOnSignal(): void;

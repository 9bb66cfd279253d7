export interface Counts {
  readonly passed: number;
  readonly failed: number;
  readonly skipped: number;
}
export interface VitestReport {
  readonly numPassedTests: number;
  readonly numFailedTests: number;
  readonly numPendingTests: number;
  readonly numTodoTests: number;
  readonly testResults: readonly {
    readonly status: string;
    readonly assertionResults: readonly { readonly status: string }[];
  }[];
}
export interface PlaywrightReport {
  readonly stats: {
    readonly expected: number;
    readonly unexpected: number;
    readonly flaky: number;
    readonly skipped: number;
  };
  readonly errors: readonly unknown[];
}
export function countExitCode(code: number): Counts;
export function countVitest(report: VitestReport): Counts;
export function countPlaywright(report: PlaywrightReport): Counts;
export function countSuite<R>(count: (report: R) => Counts, report: R | null, exitCode: number): Counts;
export function sumCounts(counts: readonly Counts[]): Counts;
export function countsLine(counts: Counts): string;

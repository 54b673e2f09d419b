/** The part of a test run's report that is counted. */
export interface TestReport {
  testResults: { status: string; name: string; assertionResults: { status: string }[] }[];
}

/** Tests that passed and failed; whatever is not a success counts as a failure. */
export function countReport(report: TestReport, exitCode: number): { passed: number; failed: number };

/** Reads the machine-readable report of a test run. */

/**
 * Tests that passed and failed. A file that could not be loaded, a test that was skipped, and a failure outside every
 * test count as failed: none of them is a success.
 * @param {{ testResults: { status: string, name: string, assertionResults: { status: string }[] }[] }} report
 * @param {number} exitCode
 */
export function countReport(report, exitCode) {
  const result = { passed: 0, failed: 0 };
  for (const file of report.testResults) {
    const passed = file.assertionResults.filter(({ status }) => status === 'passed').length;
    const failed = file.assertionResults.length - passed;
    result.passed += passed;
    result.failed += failed > 0 ? failed : file.status === 'passed' && passed > 0 ? 0 : 1;
  }
  if (exitCode !== 0 && result.failed === 0) result.failed = 1;
  return result;
}

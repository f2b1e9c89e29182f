/** Counts passed and failed tests; a file that could not be run and a failure outside of tests count as failed. */
export function countTests(report, exitCode) {
  const brokenFiles = (report?.testResults ?? []).filter(
    (file) => file.status === "failed" && !file.assertionResults.some((test) => test.status === "failed"),
  ).length;
  const passed = report?.numPassedTests ?? 0;
  const failed = (report?.numFailedTests ?? 0) + brokenFiles;
  return { passed, failed: failed === 0 && exitCode !== 0 && passed > 0 ? 1 : failed };
}

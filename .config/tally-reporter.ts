/** The last line of a test run in a form that any reader of logs can count: "N passed, N failed, N skipped". */
import type {Reporter, TestModule} from 'vitest/node';

export default class TallyReporter implements Reporter {
	onTestRunEnd(modules: readonly TestModule[]): void {
		const count = {passed: 0, failed: 0, skipped: 0, pending: 0};
		for (const module of modules) {
			for (const test of module.children.allTests()) count[test.result().state]++;
			if (module.errors().length > 0) count.failed++;
		}
		process.stdout.write(`\n${count.passed} passed, ${count.failed} failed, ${count.skipped} skipped\n`);
	}
}

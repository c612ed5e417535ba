import type { Reporter, TestModule } from "vitest/node";

/**
 * Tells of a test file that throws before its tests are known, by adding one failed test to it. Much is computed in
 * the body of a `describe`; a mutant that throws there leaves no test to fail, and would count as a survivor.
 */
export class CollectionFailures implements Reporter {
  onTestModuleEnd(module: TestModule): void {
    const errors = module.errors();
    if (errors.length === 0) return;
    const file = (module as unknown as { task: FileTask }).task;
    if (file.tasks.some((task) => task.name === collected)) return;
    file.tasks.push({ type: "test", name: collected, mode: "run", file, result: { state: "fail", errors } });
  }
}

const collected = "could be collected";

/** What is read of the runner's own record of a file. */
interface FileTask {
  filepath: string;
  tasks: { type: string; name: string; mode: string; file: FileTask; result: object }[];
}

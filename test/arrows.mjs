// Runs the arrows and fails when nothing was read: a check that saw no module proves nothing.
import { cruise } from "dependency-cruiser";
import extractTSConfig from "dependency-cruiser/config-utl/extract-ts-config";
import config from "../.dependency-cruiser.mjs";

const { output } = await cruise(
  ["src"],
  { ...config.options, ruleSet: { forbidden: config.forbidden }, validate: true },
  undefined,
  { tsConfig: extractTSConfig("tsconfig.json") },
);
const { violations, totalCruised } = output.summary;
for (const { rule, from, to } of violations) console.error(`${rule.name}: ${from} -> ${to}`);
const read = output.modules.filter((module) => /^src\/.*\.tsx?$/.test(module.source)).length;
console.log(`arrows: ${read} modules of src read, ${totalCruised} in all, ${violations.length} forbidden`);
process.exit(violations.length > 0 || read === 0 ? 1 : 0);

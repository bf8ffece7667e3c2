import { parseArgs } from 'node:util';

import { ensureDebianPackages, toTest } from './debian-packages.mjs';
import { ensureNpmPackages } from './npm-packages.mjs';
import { inProject } from './places.mjs';
import { main, say, SetupError } from './say.mjs';
import { createStoppers } from './stoppers.mjs';
import { startTestDatabase } from './test-database.mjs';
import { needDatabase, steps, TEST_BUILD } from './test-steps.mjs';

/** The steps that `--only unit,lint` names, or all; browser tests bring their build with them. */
function chosenSteps() {
  const { values } = parseArgs({ options: { only: { type: 'string' } } });
  if (values.only === undefined) return steps;
  const names = new Set(values.only.split(','));
  const unknown = [...names].filter((name) => !steps.some((step) => step.name === name));
  if (unknown.length > 0) {
    const known = steps.map((step) => step.name).join(', ');
    throw new SetupError(`There is no step ${unknown.join(', ')}. The steps are ${known}.`);
  }
  if (names.has('browser')) names.add('build');
  return steps.filter((step) => names.has(step.name));
}

/** Runs every step, whatever the others say; hands back how many checks passed and which did not. */
async function runSteps(chosen, env) {
  let passed = 0;
  const failures = [];
  for (const step of chosen) {
    say(`\n— ${step.what}`);
    const begun = Date.now();
    const outcome = await step.run(env);
    passed += outcome.passed;
    failures.push(...outcome.failures);
    const seconds = ((Date.now() - begun) / 1000).toFixed(1);
    say(`  ${outcome.passed} passed, ${outcome.failures.length} failed in ${seconds} s`);
  }
  return { passed, failures };
}

await main(async () => {
  const chosen = chosenSteps();
  const stoppers = createStoppers();
  try {
    await ensureDebianPackages(toTest);
    await ensureNpmPackages();
    const env = { ...process.env, NODE_ENV: 'test', TEST_BUILD: inProject(TEST_BUILD) };
    delete env['DATABASE_URL'];
    if (chosen.some((step) => needDatabase.has(step.name))) {
      env['TEST_DATABASE_SERVER'] = await startTestDatabase(stoppers);
    }
    const { passed, failures } = await runSteps(chosen, env);
    await stoppers.stopAll();
    if (failures.length > 0) {
      say('\nFailed:');
      for (const failure of failures) say(`  ${failure}`);
      process.exitCode = 1;
    }
    say(`\n${passed} passed, ${failures.length} failed`);
  } finally {
    await stoppers.stopAll();
  }
});

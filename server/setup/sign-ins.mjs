import { pathToFileURL } from 'node:url';

import { inProject } from './places.mjs';
import { say } from './say.mjs';

/**
 * Prints who can sign in to the demo, from the module that the seed takes them from.
 * @param {(url: string) => Promise<object>} load
 * @param {string} file the module's path within the project
 */
export async function showSignIns(load, file) {
  const module = await load(pathToFileURL(inProject(file)).href);
  const people = Object.values(module.demoPeople);
  const width = Math.max(...people.map((person) => person.email.length));
  say(`Demo sign-ins, each with the password “${module.DEMO_PASSWORD}”:`);
  for (const person of people) say(`  ${person.email.padEnd(width)}  ${person.roles.join(', ')}`);
}

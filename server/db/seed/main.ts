import { readSettings } from '../../config/settings.ts';
import { createContext } from '../../context.ts';
import { seedDemo } from './seed-demo.ts';

/** The same numbers each time (a linear congruential generator, Numerical Recipes), so that every demo is alike. */
function repeatable(): () => number {
  let state = 20_261;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
}

const context = createContext(readSettings(process.env), { random: repeatable() });
try {
  const seeded = await seedDemo(context);
  console.log(
    seeded ? 'The demo has been stored.' : 'The database holds people already; the demo was left out.',
  );
} finally {
  await context.close();
}

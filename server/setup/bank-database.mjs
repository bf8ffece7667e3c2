import { startMariadb } from './mariadb.mjs';
import { inData, makeDataFolder } from './places.mjs';
import { keptSecret } from './secrets.mjs';

const DATABASE = 'graticule';

/** SQL that makes a person of the database or brings their password up to date. */
function account(name, password, rights, scope) {
  return [
    `create user if not exists '${name}'@'127.0.0.1' identified by '${password}'`,
    `alter user '${name}'@'127.0.0.1' identified by '${password}'`,
    `grant ${rights} on ${scope} to '${name}'@'127.0.0.1'`,
  ];
}

/**
 * Starts the project's MariaDB with the bank's database. Two accounts share it: the owner changes the schema, the
 * application only reads and writes rows.
 * @returns {Promise<import('./mariadb.mjs').Mariadb & { ownerUrl: string, applicationUrl: string }>}
 */
export async function startBankDatabase(stoppers) {
  makeDataFolder();
  const ownerPassword = keptSecret('database-owner-password');
  const applicationPassword = keptSecret('database-application-password');
  const mariadb = await startMariadb({
    folder: inData('mariadb'),
    stoppers,
    statements: [
      `create database if not exists ${DATABASE} character set utf8mb4 collate utf8mb4_unicode_ci`,
      ...account('graticule_owner', ownerPassword, 'all privileges', `${DATABASE}.*`),
      ...account('graticule', applicationPassword, 'select, insert, update, delete', `${DATABASE}.*`),
    ],
  });
  const at = `127.0.0.1:${mariadb.port}/${DATABASE}`;
  return {
    ...mariadb,
    ownerUrl: `mysql://graticule_owner:${ownerPassword}@${at}`,
    applicationUrl: `mysql://graticule:${applicationPassword}@${at}`,
  };
}

/**
 * The statements mariadbd runs at each start, before it answers anyone: they make the accounts what credentials.json
 * says, however the last run ended. Each statement stands on one line, as an init file demands.
 *
 * The owner holds everything on the one schema and may pass it on, which is how the migrations grant the application
 * its share table by table. The application starts with nothing at all, and no account but root sees another schema.
 */
export function accountStatements({ database, root, owner, application }) {
  return [
    // mariadb-install-db leaves administrators without a password on every name of the machine.
    `DELETE FROM mysql.global_priv WHERE User = '' OR (User = 'root' AND Host NOT IN ('localhost', '127.0.0.1'));`,
    'FLUSH PRIVILEGES;',
    ...account(root.user, 'localhost', root.password),
    ...account(root.user, '127.0.0.1', root.password),
    `GRANT ALL PRIVILEGES ON *.* TO '${root.user}'@'127.0.0.1' WITH GRANT OPTION;`,
    `CREATE DATABASE IF NOT EXISTS \`${database}\` CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_520_ci;`,
    ...account(owner.user, '127.0.0.1', owner.password),
    `GRANT ALL PRIVILEGES ON \`${database}\`.* TO '${owner.user}'@'127.0.0.1' WITH GRANT OPTION;`,
    ...account(application.user, '127.0.0.1', application.password),
  ];
}

function account(user, host, password) {
  const name = `'${user}'@'${host}'`;
  return [`CREATE USER IF NOT EXISTS ${name};`, `ALTER USER ${name} IDENTIFIED BY '${password}';`];
}

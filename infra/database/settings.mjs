import { join } from 'node:path';

/** What holds for every server: one character set, UTC, loopback only, and errors instead of silent changes. */
const always = [
  '--bind-address=127.0.0.1',
  '--skip-name-resolve',
  '--local-infile=0',
  '--skip-symbolic-links',
  '--character-set-server=utf8mb4',
  '--collation-server=utf8mb4_unicode_520_ci',
  '--default-time-zone=+00:00',
  // ONLY_FULL_GROUP_BY is left out: MariaDB 10.11 does not see that a primary key determines its row's other columns.
  '--sql-mode=STRICT_ALL_TABLES,NO_ZERO_IN_DATE,NO_ZERO_DATE,ERROR_FOR_DIVISION_BY_ZERO,NO_ENGINE_SUBSTITUTION',
  '--default-storage-engine=InnoDB',
  // A transaction that read a row before another changed it is refused (1020) instead of overwriting the change.
  '--innodb-snapshot-isolation=ON',
  // The unit of work retries whole transactions, so a timed-out one must not stay half done.
  '--innodb-rollback-on-timeout=ON',
  '--innodb-lock-wait-timeout=10',
  '--max-allowed-packet=64M',
  '--max-connections=300',
];

/** An acknowledged commit survives the death of the process and of the machine. */
const durable = [
  '--innodb-flush-log-at-trx-commit=1',
  '--sync-binlog=1',
  '--log-bin=binlog',
  '--binlog-format=ROW',
  '--binlog-expire-logs-seconds=604800',
  '--server-id=1',
  '--innodb-buffer-pool-size=512M',
];

/** Test data may be lost with the machine: no waiting for the disk. */
const fast = [
  '--innodb-flush-log-at-trx-commit=2',
  '--skip-log-bin',
  '--innodb-doublewrite=0',
  '--innodb-buffer-pool-size=256M',
];

/**
 * The arguments of mariadbd for a server of our own. No option file is read, so the machine's own MariaDB has no say.
 * The socket is named relative to the data folder: it can clash with no other server, and the length limit of a socket's
 * path (107 bytes) does not forbid a deep clone.
 *
 * @param durability 'durable' as in production, or 'fast' for tests
 */
export function serverArguments({ dataFolder, port, initFile, durability }) {
  return [
    '--no-defaults',
    `--datadir=${dataFolder}`,
    `--port=${port}`,
    '--socket=mariadbd.sock',
    `--pid-file=${join(dataFolder, 'mariadbd.pid')}`,
    `--init-file=${initFile}`,
    ...runAs(),
    ...always,
    ...(durability === 'fast' ? fast : durable),
  ];
}

/** mariadbd refuses to run as root unless told to; the folder of a clone is often closed to the account mysql. */
export function runAs() {
  return process.getuid?.() === 0 ? ['--user=root'] : [];
}

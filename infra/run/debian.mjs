import { findProgram } from '../database/programs.mjs';
import { runCommand } from './commands.mjs';
import { step } from './say.mjs';

/** What we take from Debian: the program that shows it is there, its name for people, its packages. */
export const mariadb = { program: 'mariadbd', title: 'MariaDB', packages: ['mariadb-server'] };
export const chromium = {
  program: 'chromium',
  title: 'Chromium',
  packages: ['chromium', 'fonts-liberation'],
};

/** Installs the missing ones from Debian. */
export async function ensureFromDebian(...wanted) {
  const missing = wanted.filter(({ program }) => !findProgram(program));
  if (missing.length === 0) return;
  const packages = missing.flatMap((one) => one.packages);
  const titles = missing.map(({ title }) => title).join(' and ');
  const install = await installer(titles, packages);
  await step(`Installing ${titles} from Debian`, async () => {
    await install('update');
    await install('install', '-y', '--no-install-recommends', ...packages);
  });
}

async function installer(titles, packages) {
  const apt = findProgram('apt-get');
  const byHand = `apt-get install --no-install-recommends ${packages.join(' ')}`;
  if (!apt)
    throw new Error(`${titles} is missing, and this is not Debian: please install ${packages.join(' ')}.`);
  const prefix =
    process.getuid?.() === 0 ? [] : await sudo(`${titles} is missing. As root, run:\n  ${byHand}`);
  const fixed = ['env', 'DEBIAN_FRONTEND=noninteractive', apt, '-q', '-o', 'DPkg::Lock::Timeout=300'];
  const [command, ...words] = [...prefix, ...fixed];
  return (...more) => runCommand(command, [...words, ...more], { mustFinish: true });
}

/** sudo that asks for no password: there may be nobody to type one. */
async function sudo(otherwise) {
  try {
    await runCommand('sudo', ['-n', 'true']);
    return ['sudo', '-n'];
  } catch {
    throw new Error(otherwise);
  }
}

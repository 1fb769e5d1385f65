import { plantKey } from '@/lib/access/secret';
import { type Environment, readEnvironment } from '@/lib/env';
import { buildApp, isBuilt } from '../build-app';
import { withProgress } from '../progress';
import { alreadyRunning, removeServingNote, writeServingNote } from '../serving-note';
import { stopSignal } from '../stop-signal';
import { type ExitStatus, UsageError, type Verb, type VerbOutput } from '../verb';
import { startWebServer } from '../web-server';

export const serve: Verb = {
  name: 'serve',
  summary: 'start the database and the web app',
  usage: [
    'evenohm serve [--dev]',
    '',
    '  --dev   development: no build, pages follow the sources',
    '',
    'Ctrl-C or SIGTERM stops both. Settings come from the environment: DATABASE_URL, EVENOHM_DATA, PORT,',
    'EVENOHM_HOST, EVENOHM_URL, EVENOHM_SECRET, EVENOHM_TRUSTED_PROXY, EVENOHM_SITE_TIME_ZONE, EVENOHM_DEMO,',
    'EVENOHM_OIDC_ISSUER and what goes with it: the README tells of each.',
  ].join('\n'),
  async run(args, output) {
    const strange = args.find((word) => word !== '--dev');
    if (strange !== undefined) throw new UsageError(`“${strange}” is not understood.`);
    return serveUntilStopped(args.includes('--dev'), readEnvironment(), output);
  },
};

async function serveUntilStopped(
  dev: boolean,
  environment: Environment,
  output: VerbOutput,
): Promise<ExitStatus> {
  plantKey('sessions');
  Object.assign(process.env, {
    NODE_ENV: dev ? 'development' : 'production',
    NEXT_TELEMETRY_DISABLED: '1',
  });
  const { say } = output;
  const stop = stopSignal();
  const closers: (() => Promise<void> | void)[] = [];
  try {
    const { AlreadyServing, openDatabase } = await import('@/lib/database/connection');
    const opening = await withProgress(say, 'Opening the database', () =>
      openDatabase({ say, serving: true }).catch((error: unknown) => {
        if (error instanceof AlreadyServing) return null;
        throw error;
      }),
    );
    if (opening === null) {
      say(alreadyRunning(environment.dataFolder));
      return 1;
    }
    closers.push(() => opening.close());
    stop.throwIfAborted();
    const web = await startWebServer({ ...environment, dev, isAway: opening.isAway });
    closers.push(() => web.close());
    if (opening.embedded) {
      writeServingNote(environment.dataFolder, { pid: process.pid, address: web.address });
      closers.push(() => removeServingNote(environment.dataFolder));
    }
    await prepareAccess(web.address, say);
    if (environment.demo) await seedFirstStart(say);
    stop.throwIfAborted();
    if (!dev && !isBuilt()) await withProgress(say, 'Building the app', () => buildApp(stop));
    stop.throwIfAborted();
    await web.open();
    output.out(`Evenohm is at ${web.address}`);
    await new Promise((resolve) => stop.addEventListener('abort', resolve, { once: true }));
  } catch (error) {
    if (!stop.aborted) throw error;
  } finally {
    if (stop.aborted) say('Stopping…');
    for (const close of closers.reverse()) await close();
  }
  say('Stopped.');
  return 0;
}

/** Puts the demonstration line into a database that holds no stream yet, or goes on with it after an interruption. */
async function seedFirstStart(say: (text: string) => void): Promise<void> {
  const { demoDue, seedDemo } = await import('@/seed/seed-demo');
  const endAt = await demoDue();
  if (endAt === null) return;
  await withProgress(say, 'Filling in the demonstration line', () => seedDemo(say, endAt));
}

/**
 * Says what is wrong with the end of the audit trail and tells there of what is not yet in it, puts in the people of the
 * demonstration line, and says how the first administrator gets in.
 */
async function prepareAccess(address: string, say: (text: string) => void): Promise<void> {
  const { ensureDemonstrationPeople, isDemonstrationOffered } = await import('@/lib/access/demonstration');
  const { firstAdministratorCode, isFirstAdministratorDue } =
    await import('@/lib/access/first-administrator');
  const { auditWarning } = await import('@/lib/access/audit-at-start');
  const { chainAccessEvents } = await import('@/lib/access/chain-access-events');
  const warning = await auditWarning();
  if (warning !== null) say(`${warning} Look into it: npx evenohm audit --verify.`);
  if (isDemonstrationOffered()) await ensureDemonstrationPeople();
  await chainAccessEvents();
  if (!(await isFirstAdministratorDue())) return;
  say(
    `There is no administrator yet: enter one at ${address}/first-administrator, from elsewhere with the code ${firstAdministratorCode()}.`,
  );
}

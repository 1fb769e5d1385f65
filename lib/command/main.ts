import { EnvironmentError } from '@/lib/env';
import { AppError } from '@/lib/errors';
import { type ExitStatus, UsageError, type Verb, type VerbOutput } from './verb';
import { verbLoaders } from './verb-loaders';

/**
 * Runs one command line and returns its exit status. Wrong usage and expected failures become one line each on
 * `say`; what nobody expected keeps its stack, so that it can be mended.
 */
export async function runCommand(words: readonly string[], output: VerbOutput): Promise<ExitStatus> {
  const [name, ...args] = words;
  if (name === undefined || name === '--help' || name === 'help') {
    const text = await overview();
    (name === undefined ? output.say : output.out)(text);
    return name === undefined ? 2 : 0;
  }
  const load = verbLoaders.get(name);
  if (load === undefined) {
    output.say(`evenohm: there is no verb “${name}”. See evenohm --help.`);
    return 2;
  }
  const verb = await load();
  if (args.includes('--help')) {
    output.out(`${verb.summary}\n\n${verb.usage}`);
    return 0;
  }
  return runVerb(verb, args, output);
}

async function runVerb(verb: Verb, args: string[], output: VerbOutput): Promise<ExitStatus> {
  try {
    return await verb.run(args, output);
  } catch (error) {
    if (error instanceof UsageError) {
      output.say(`evenohm ${verb.name}: ${error.message}\nSee evenohm ${verb.name} --help.`);
      return 2;
    }
    if (error instanceof AppError || error instanceof EnvironmentError) {
      output.say(`evenohm ${verb.name}: ${error.message}`);
    } else {
      output.say(error instanceof Error ? (error.stack ?? error.message) : String(error));
    }
    return 1;
  }
}

async function overview(): Promise<string> {
  const verbs = await Promise.all([...verbLoaders.values()].map((load) => load()));
  const width = Math.max(...verbs.map((verb) => verb.name.length));
  const lines = verbs.map((verb) => `  ${verb.name.padEnd(width)}  ${verb.summary}`);
  return ['evenohm VERB …', '', ...lines, '', 'evenohm VERB --help tells more of one verb.'].join('\n');
}

import { buildApp, isBuilt } from '../build-app';
import { withProgress } from '../progress';
import { stopSignal } from '../stop-signal';
import { UsageError, type Verb } from '../verb';

export const build: Verb = {
  name: 'build',
  summary: 'build the web app, where its build is older than its sources',
  usage: 'evenohm build',
  async run(args, output) {
    if (args.length > 0) throw new UsageError(`“${args[0]}” is not understood.`);
    if (isBuilt()) output.say('The build is up to date.');
    else await withProgress(output.say, 'Building the app', () => buildApp(stopSignal()));
    return 0;
  },
};

import { parseConfig } from '../config/config';
import { readEnvironment } from '../config/environment';
import { makeBackup } from '../database/backup';
import { StartProblem } from '../local/start-problem';
import { runCommand } from './run-command';

void runCommand(async () => {
  const [path, ...rest] = process.argv.slice(2);
  if (path === undefined || rest.length > 0) throw new StartProblem('Type: npm run backup -- FILE');
  await makeBackup(parseConfig(readEnvironment()), path);
  process.stdout.write(`Saved to ${path}. It holds everything, the secret included: keep it safe.\n`);
});

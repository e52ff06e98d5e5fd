import { parseConfig } from '../config/config';
import { readEnvironment } from '../config/environment';
import { restoreBackup } from '../database/backup';
import { StartProblem } from '../local/start-problem';
import { runCommand } from './run-command';

void runCommand(async () => {
  const [path, ...rest] = process.argv.slice(2);
  if (path === undefined || rest.length > 0) throw new StartProblem('Type: npm run restore -- FILE');
  const config = parseConfig(readEnvironment());
  await restoreBackup(config, path);
  process.stdout.write(`Restored into ${config.dataFolder}.\n`);
});

import { openExpoFront } from './local/expo-front';
import { run } from './run';

void run(openExpoFront);

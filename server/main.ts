import { run } from './run';

void run();

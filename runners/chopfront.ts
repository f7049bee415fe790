#!/usr/bin/env node
/** The program's entry: everything is in main.ts; here only the process's own ends are tied. */
import { explain, main } from './main.ts';
import { endOnClosedPipe } from './terminal/output.ts';

endOnClosedPipe();
process.on('uncaughtException', (error) => process.exit(explain(error)));
process.on('unhandledRejection', (error) => process.exit(explain(error)));
process.exitCode = await main(process.argv.slice(2));

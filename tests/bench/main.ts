/** All benchmarks: correctness first, then times; ends with 1 where a budget is missed. Another seed may be given. */
import {finish, line, machine} from './harness.ts';
import {benchOneStraight} from './one-straight.ts';
import {benchProcesses} from './processes.ts';
import {benchScreen} from './screen.ts';
import {benchGrowth, benchWholeSolver} from './whole-solver.ts';

const seed = Number(process.argv[2] ?? 20_260_731);
line(`${machine()}, seed ${seed}`);
line();
benchWholeSolver(seed);
line();
benchOneStraight();
line();
benchGrowth(seed);
line();
benchProcesses();
line();
await benchScreen(process.cwd());
finish();

/** All benchmarks: correctness first, then times; ends with 1 where a budget is missed. Another seed may be given. */
import {Figures} from './budgets.ts';
import {line, machine} from './harness.ts';
import {benchLogs} from './logs.ts';
import {benchOneStraight} from './one-straight.ts';
import {benchProcesses} from './processes.ts';
import {benchGrowth, benchRack} from './rack.ts';
import {writeReadme} from './readme-table.ts';
import {benchScreen} from './screen.ts';

const words = process.argv.slice(2);
const seed = Number(words.find(word => /^\d+$/.test(word)) ?? 20_260_731);
const figures = new Figures();
line(`${machine()}, seed ${seed}`);
line();
await benchRack(figures, seed);
line();
benchOneStraight(figures);
line();
await benchGrowth(figures, seed);
line();
benchProcesses(figures);
line();
await benchScreen(process.cwd(), figures);
line();
benchLogs(figures, seed);
line();
if (!figures.conclude()) process.exitCode = 1;
if (words.includes('--write-readme')) writeReadme(figures.measured);

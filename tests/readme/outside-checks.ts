/** Everything that the README's table compares, in its order. */
import {dayAndEngine} from './checks/air.ts';
import {curve} from './checks/curve.ts';
import {fuel} from './checks/fuel.ts';
import {gearing} from './checks/gearing.ts';
import {integrator} from './checks/integrator.ts';
import {loading} from './checks/loading.ts';
import {motion} from './checks/motion.ts';
import {odds} from './checks/odds.ts';
import {practice} from './checks/practice.ts';
import {tires} from './checks/tires.ts';
import type {OutsideCheck} from './outside-check.ts';

export const outsideChecks: readonly OutsideCheck[] = [
	...gearing,
	...tires,
	...dayAndEngine,
	...curve,
	...motion,
	...fuel,
	...loading,
	...practice,
	...odds,
	...integrator,
];

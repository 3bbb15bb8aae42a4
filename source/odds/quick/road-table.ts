/** What a road holds against a vehicle, and what grip gives there, at the speeds of the grid: the same for every pair and set. */
import {type Road, type RoadForces, roadForces} from '../../drivetrain/forces.ts';
import type {Vehicle} from '../../drivetrain/straight.ts';
import {nodeSpeeds, nodes} from './speed-grid.ts';

export type RoadTable = {
	readonly road: Road;
	readonly forces: RoadForces;
	/** Resistance at each node, N. */
	readonly resistanceN: Float64Array;
	/** Acceleration that grip holds at each node, m/s². */
	readonly heldMps2: Float64Array;
};

/** `perHeldKg` is 1/m_g of the vehicle at each node. Only the nodes from `fromNode` on are filled. */
export function roadTable(vehicle: Vehicle, road: Road, perHeldKg: Float64Array, fromNode: number): RoadTable {
	const forces = roadForces(vehicle, road);
	const {headwindMps, fixedN, dragKgPerM, rollingKgPerM, gripN, gripKgPerM} = forces;
	const resistanceN = new Float64Array(nodes);
	const heldMps2 = new Float64Array(nodes);
	for (let node = fromNode; node < nodes; node++) {
		const air = nodeSpeeds[node]! + headwindMps;
		const square = air * air;
		const resistance = fixedN + (air < 0 ? -dragKgPerM : dragKgPerM) * square + rollingKgPerM * square;
		resistanceN[node] = resistance;
		heldMps2[node] = (gripN + gripKgPerM * square - resistance) * perHeldKg[node]!;
	}
	return {road, forces, resistanceN, heldMps2};
}

/** The lists of tracks and of cars: one line each. */
import {type Block, cell, type Making, tableOf} from './blocks.ts';

export type ListedTrack = {
	name: string;
	file: string;
	type: string;
	straights: number;
	situations: number;
	from: string;
};
export type ListedCar = {
	name: string;
	file: string;
	types: string[];
	gearboxes: number;
	pairs: number;
	from: string;
	preferred: boolean;
};

const count = (number: number, one: string) => `${number} ${one}${number === 1 ? '' : 's'}`;

const trackColumns: readonly Making<ListedTrack>[] = [
	{head: 'name', align: 'left', keep: 0, shortest: 16, cell: track => cell(track.name, 'strong')},
	{head: 'also', align: 'left', keep: 2, cell: track => cell(track.file)},
	{head: 'type', align: 'left', keep: 1, cell: track => cell(track.type)},
	{head: 'straights', align: 'left', keep: 3, cell: track => cell(count(track.straights, 'straight'))},
	{head: 'situations', align: 'left', keep: 5, cell: track => cell(count(track.situations, 'situation'))},
	{head: 'from', align: 'left', keep: 4, cell: track => cell(track.from, 'muted')},
];

const carColumns: readonly Making<ListedCar>[] = [
	{
		head: 'name',
		align: 'left',
		keep: 0,
		shortest: 16,
		cell: car => cell(car.name + (car.preferred ? '*' : ''), 'strong'),
	},
	{head: 'also', align: 'left', keep: 2, cell: car => cell(car.file)},
	{head: 'engines for', align: 'left', keep: 3, shortest: 10, cell: car => cell(car.types.join(', '))},
	{head: 'sets', align: 'left', keep: 5, cell: car => cell(count(car.gearboxes, 'set'))},
	{head: 'pairs', align: 'left', keep: 1, cell: car => cell(count(car.pairs, 'pair'))},
	{head: 'from', align: 'left', keep: 4, cell: car => cell(car.from, 'muted')},
];

export const trackListView = (tracks: readonly ListedTrack[]): Block[] => [tableOf(trackColumns, tracks)];
export const carListView = (cars: readonly ListedCar[]): Block[] => [tableOf(carColumns, cars)];

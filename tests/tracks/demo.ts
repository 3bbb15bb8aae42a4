/** The shipped demo documents, read from disk through the reader. */
import {readdirSync, readFileSync} from 'node:fs';
import {describeProblems, type Reading, readCar, readTrack} from '../../source/documents/read.ts';

const directory = new URL('../../tracks/', import.meta.url);

export const trackFiles = readdirSync(directory).filter(file => file.endsWith('.json'));
export const carFiles = readdirSync(new URL('cars/', directory)).filter(file => file.endsWith('.json'));

async function shipped<T>(file: string, read: (text: string) => Promise<Reading<T>>): Promise<T> {
	const reading = await read(readFileSync(new URL(file, directory), 'utf8'));
	if (!reading.ok) throw new Error(describeProblems(file, reading.problems));
	return reading.value;
}

export const shippedTrack = (file: string) => shipped(file, readTrack);
export const shippedCar = (file: string) => shipped(`cars/${file}`, readCar);

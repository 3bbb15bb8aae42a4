/** Everything that reads what people and strangers write. */
import type {Reader} from './reader.ts';
import {commandLines} from './readers/commands.ts';
import {cars, tracks} from './readers/documents.ts';
import {expressions} from './readers/expressions.ts';
import {fields} from './readers/fields.ts';
import {keys} from './readers/keys.ts';
import {logs, practice} from './readers/logs.ts';
import {plans} from './readers/plans.ts';
import {quantities} from './readers/quantities.ts';
import {rankings} from './readers/rankings.ts';
import {openedDocuments, screen} from './readers/screen.ts';
import {storeFiles} from './readers/store.ts';

export const readers: readonly Reader[] = [
	quantities,
	expressions,
	tracks,
	cars,
	rankings,
	plans,
	logs,
	practice,
	storeFiles,
	commandLines,
	keys,
	fields,
	screen,
	openedDocuments,
];

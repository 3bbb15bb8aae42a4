/** A plan made as small as a QR code needs it, and back. */
import {deflateRawSync, inflateRawSync} from 'node:zlib';
import {checkCode} from './check-code.ts';
import type {PlanReading} from './check-plan.ts';
import {mostEntries} from './find-entries.ts';
import {longestMessage} from './message-words.ts';
import type {PlanDocument} from './plan-document.ts';
import {entriesOf} from './plan-entries.ts';
import {canonical} from './print-plan.ts';
import {planFromEntries} from './read-plan.ts';

export const densePrefix = 'DRP1:';

/**
 * QR's alphanumeric set (ISO/IEC 18004) without the four characters that messages change or eat: blank, `$`, `%`, `*`. Its 41³ is
 * just above 2¹⁶, so three characters hold two bytes, as in base 45 (RFC 9285).
 */
const alphabet = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ+-./:';
const base = alphabet.length;

/** What most plans hold, so that it need not be in the code. A change of it needs a new prefix. */
const dictionary = Buffer.from(
	[
		'Rules: superspeedway.rpmLimit 8600, short.pairs 33/38; intermediate.gearboxes road.',
		'Installed: pair 33/38, gearbox A\nMargins: limitRpm 100, shiftRpm 100, downshiftRpm 200, cleanRpm 2500, settleStart 0.6 s',
		'\nRack pair: driving 33, driven 38, sets 2, miles 0, maxMiles 1200\nRack: toothSums 71; 72, eitherShaft true, ',
		'\nTires: left 86.4 in, right 86.6 in, growth 0.8 %, slip 1.5 %, steadySlip 0 %\nGearbox A: ratios 2.9; 2.04; 1.58; 1.24; 1\n',
		'Engine : for short; intermediate; road; superspeedway, rpmLimit 9200, inertia 0.14 kg m^2, correctedTo J1349, limiter 9300, ',
		'pullRpm 4000, bandShare 0.9, curve 4000 405 lbf ft; 4500 410 lbf ft; 5000 420 lbf ft; 5500 430 lbf ft; 6000 440 lbf ft; ',
		'6500 450 lbf ft; 7000 445 lbf ft; 7500 430 lbf ft; 8000 410 lbf ft; 8500 380 lbf ft; 9000 360 lbf ft; 9500 330 N m; 00 lbf ft',
		'\nCar : mass 3650 lb, rearShare 0.5, dragArea 0.95 m^2, downforceArea 1.6 m^2, rearDownforceShare 0.5, rolling 0.018, grip 1.25, ',
		'wheelInertia 4 kg m^2, undrivenInertia shiftTime 0.1 s, reactionTime 0.25 s, wheelbase 110 in, cgHeight 18 in, finalDrive 3.25, ',
		'efficiency 0.92, efficiencies 0.9; On the car here: tires.left 86.1 in, tires.right 86.3 in, tires.slip grip 1.2, mass lb\n',
		'Rules here: rpmLimit 8900\nSituation Qualifying: share 0.25, power +5 hp, grip +2 %, headwind 5 mph, end +1 mph, entry +1 mph, mass -80 lb\n',
		'Situation Cool night: air.temperature 58 degF, air.humidity 60 %, wind.speed 2 mph, wind.from 120 deg\nSituation Hot day: ',
		'Situation Long run: exit -3 mph, minimum -3 mph, rollout +0.3 in, share 2\nSituation Race start: mass +20 lb, exit -2 mph, share 0.5\n',
		'Situation Base: share 1\nSituation In the tow: exit +0.5 mph, minimum +0.5 mph, drag -15 %, mass -60 lb, rollout -0.2 in\n',
		'Straight Back: exit 90 mph, minimum 82 mph, length 800 ft\nStraight Front: exit 88 mph, minimum 80 mph, length 650 ft, entry 92 mph, ',
		'braking 0.9 g, grade 0.5 %, heading 90 deg, load 1.1, extraDrag 100 N, gears 4; 5, measured.end 116 mph, measured.rpm 8420, ',
		'measured.pair 33/38, measured.gearbox A, measured.gear 4\n km/h m \nRestart: speed 50 mph, distance 700 ft, gear 2',
		'\nPit road: limit 40 mph, tolerance 5 mph, gear 2\nWind: speed 8 mph, from 270 deg\nAir: temperature 75 degF, pressure 28.9 inHg, humidity 40 %',
		'\nTrack : type short, lap 0.6 mi\nNotes: \nRestart RPM: gear 2, rpm 4410\nPit RPM: gear 2, rpm 3531, tolerance 3971\n',
		'Shift 4: rpm 9100, light 8900\nShift 3: rpm 9100, light 8900\nHighest Base: rpm 8900, at Front end\nHighest In the tow: rpm 8900, at Back end\n',
		'Highest Long run: rpm 9100, at Front shift 3-4\nLimit: rpm 9000, from engine\nLimit: rpm 9000, from track\n',
		'DROPRACK PLAN 1: date 2025-06-14T18:05:00.000Z, pair 33/38, gearbox A, engine ',
	].join(''),
);

/** `DRP1:` and the plan in capitals, digits and `+-./:`. */
export function densePlan(plan: PlanDocument): string {
	const content = canonical(entriesOf(plan));
	const packed = deflateRawSync(content, {level: 9, memLevel: 9, dictionary});
	return densePrefix + encode(Buffer.concat([Buffer.from(checkCode(content), 'hex'), packed]));
}

const wrong: PlanReading = {
	ok: false,
	problems: [
		{
			path: '',
			found: 'a dense plan that is damaged or cut off',
			allowed: 'the code as it was scanned, from "DRP1:" to its end',
		},
	],
};
const checkBytes = 4;

/** The plan in a message that holds one in dense form, however its lines were broken. */
export async function readDensePlan(message: string): Promise<PlanReading> {
	const start = message.indexOf(densePrefix) + densePrefix.length;
	const bytes = decode(message.slice(start, start + longestMessage).replace(/[\s>]+/g, ''));
	const content = bytes && unpack(bytes.subarray(checkBytes));
	if (content === undefined || bytes!.subarray(0, checkBytes).toString('hex') !== checkCode(content)) return wrong;
	const entries = content.split('\n', mostEntries + 1);
	return entries.length > mostEntries ? wrong : planFromEntries(entries.map(text => ({text, line: 1})));
}

function unpack(packed: Buffer): string | undefined {
	try {
		return inflateRawSync(packed, {dictionary, maxOutputLength: longestMessage}).toString('latin1');
	} catch {
		return undefined;
	}
}

/** Three characters for two bytes, least significant first; two for a last single byte. */
function encode(bytes: Uint8Array): string {
	let text = '';
	for (let i = 0; i < bytes.length; i += 2) {
		const isPair = i + 1 < bytes.length;
		let value = isPair ? bytes[i]! * 256 + bytes[i + 1]! : bytes[i]!;
		for (let digit = 0; digit < (isPair ? 3 : 2); digit++) {
			text += alphabet[value % base];
			value = Math.floor(value / base);
		}
	}
	return text;
}

/** Undefined for what `encode` does not give. */
function decode(text: string): Buffer | undefined {
	const bytes: number[] = [];
	for (let i = 0; i < text.length; i += 3) {
		const digits = [...text.slice(i, i + 3)].map(character => alphabet.indexOf(character));
		const value = digits.reduceRight((sum, digit) => sum * base + digit, 0);
		const isPair = digits.length === 3;
		if (digits.length < 2 || digits.includes(-1) || value >= (isPair ? 2 ** 16 : 2 ** 8)) return undefined;
		if (isPair) bytes.push(value >> 8, value & 0xff);
		else bytes.push(value);
	}
	return Buffer.from(bytes);
}

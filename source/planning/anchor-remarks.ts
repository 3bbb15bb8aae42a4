/** How the model stands to what was measured. */
import type {Ground} from './checks/check.ts';
import {agrees, anchorToleranceMps, type MeasuredPoint} from './measured.ts';
import {listed, rpmText, speedText} from './words.ts';

const anchorTolerance = speedText(anchorToleranceMps);

export function anchorRemarks({measured, anchored}: Ground): string[] {
	if (measured.length === 0) return ['Not anchored: no measured speed yet.'];
	const compared = measured.filter(({model, speedMps}) => model !== undefined && speedMps !== undefined);
	if (anchored) {
		return [
			`Anchored: the model meets the speed measured on ${listed(compared.map(({straight}) => straight))} within ${anchorTolerance}.`,
		];
	}
	return measured.map(remarkOn);
}

function remarkOn(point: MeasuredPoint): string {
	const {straight, candidate, speedMps, rpm, model} = point;
	if (candidate === undefined)
		return `Not anchored: ${straight} does not say with which pair and gearbox it was measured.`;
	if (speedMps === undefined) return `Not anchored: ${straight} has no measured speed or RPM that gives one.`;
	if (model === undefined) return `Not anchored: ${straight} cannot be compared, as the model has no end speed there.`;
	if (agrees(point)) return `The model meets the speed measured on ${straight} within ${anchorTolerance}.`;
	const seen = rpm === undefined ? '' : `, ${rpmText(rpm)}`;
	return `Not anchored: ${straight} measured ${speedText(speedMps)}${seen}; model ${speedText(model.speedMps)}, ${rpmText(model.rpm)} with ${candidate.pairName} ${candidate.gearbox.name}.`;
}

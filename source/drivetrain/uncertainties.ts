/**
 * How well the numbers of a document are known: from the path of a field in it (`tires.left`, `straights[0].exit`,
 * `situations[1].drag`) to one standard deviation, in the SI unit that the field is read to. Only fields that state it.
 */
export type Uncertainties = ReadonlyMap<string, number>;

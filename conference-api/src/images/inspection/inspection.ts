/** Something in a file that cleaning would not have left there. */
export interface InspectionFault {
  /** '(0010,0010)', 'APP1 (EXIF)', 'preamble', … Never a value: this is logged and sent back. */
  place: string;
  name: string;
  why: string;
}

export interface Inspection {
  /** None, and the file is clean. */
  faults: InspectionFault[];
}

/** The first faults in one sentence, for the refusal. */
export function inspectionWords({ faults }: Inspection): string {
  const named = faults.slice(0, 3).map(({ place, name, why }) => `${[place, name].filter(Boolean).join(' ')} ${why}`);
  const more = faults.length > 3 ? `; and ${faults.length - 3} more` : '';
  return `The file is not clean: ${named.join('; ')}${more}.`;
}

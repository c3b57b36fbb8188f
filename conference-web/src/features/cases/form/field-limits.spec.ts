import { readFileSync } from 'node:fs';
import { LIST_LIMITS, NUMBER_LIMITS, TEXT_LIMITS } from './field-limits';

interface Property {
  type?: string;
  minimum?: number;
  maximum?: number;
  maxLength?: number;
}

const { components } = JSON.parse(readFileSync(`${process.cwd()}/../conference-api/openapi.json`, 'utf8')) as {
  components: { schemas: Record<string, { properties: Record<string, Property> }> };
};
const SCHEMAS: Record<string, string> = {
  heading: 'HeadingDto',
  patient: 'PatientDto',
  history: 'HistoryDto',
  operations: 'EarlierOperationDto',
  parts: 'ImplantPartDto',
  screws: 'ScrewDto',
  infection: 'InfectionWorkUpDto',
  cultures: 'CultureDto',
  bone: 'BoneAndPositionDto',
  plan: 'RemovalPlanDto',
  steps: 'PlanStepDto',
  kit: 'KitItemDto',
  options: 'CaseOptionDto',
};
// set by another control (the rim clock, a list of steps), not by a text field
const NOT_TYPED = new Set(['kit.stepId']);

const properties = (place: string) => Object.entries(components.schemas[SCHEMAS[place]!]!.properties);

describe.each(Object.keys(SCHEMAS))('the limits of %s', (place) => {
  it('of numbers are those of the API’s contract', () => {
    const agreed = properties(place)
      .filter(([, { minimum }]) => minimum !== undefined)
      .map(([name, { type, minimum: min, maximum: max }]) => [name, { min, max, ...(type === 'integer' && { whole: true }) }]);
    expect(NUMBER_LIMITS[place] ?? {}).toEqual(Object.fromEntries(agreed));
  });

  it('of texts are those of the API’s contract', () => {
    const agreed = properties(place)
      .filter(([name, { maxLength }]) => maxLength !== undefined && !NOT_TYPED.has(`${place}.${name}`))
      .map(([name, { maxLength }]) => [name, maxLength]);
    expect(TEXT_LIMITS[place] ?? {}).toEqual(Object.fromEntries(agreed));
  });
});

it('every list that has items with limits has one for their number', () => {
  expect(Object.keys(LIST_LIMITS).every((list) => list in SCHEMAS)).toBe(true);
});

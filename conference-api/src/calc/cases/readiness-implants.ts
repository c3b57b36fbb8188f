import type { CaseContent, ImplantPart } from '../vocabulary/case-content.js';
import { PART } from '../vocabulary/case-content.js';
import { saysNothing } from './field-words.js';
import { saysUnknown } from './readiness-findings.js';
import type { ReadinessItem } from './readiness.js';

const section = 'implants' as const;
const said = (value: unknown) => !saysNothing(value);

/** What must be known of the parts before they are taken out. */
export function implantPoints(content: CaseContent): ReadinessItem[] {
  const parts = content.implants.parts ?? [];
  const shells = parts.filter(({ part }) => part === 'shell');
  return [
    {
      id: 'implants',
      section,
      label: 'The implants in place',
      done: parts.length > 0,
      weight: 'blocks-posting',
      remedy: 'List the parts that are in place, also those you know little of.',
    },
    ...(parts.length ? partPoints(parts) : []),
    ...(shells.length ? shellPoints(shells, parts) : []),
  ];
}

const partNames = (parts: ImplantPart[]) => [...new Set(parts.map(({ part }) => PART[part]))].join(', ');

function partPoints(parts: ImplantPart[]): ReadinessItem[] {
  const noFixation = parts.filter(({ fixation }) => !said(fixation));
  const noMaker = parts.filter(({ maker }) => !said(maker));
  const noGround = parts.filter(({ certainty, knownFrom }) => !said(certainty) || !said(knownFrom));
  return [
    {
      id: 'fixation',
      section,
      label: 'Fixation of each part',
      done: noFixation.length === 0,
      weight: 'blocks-listing',
      remedy: noFixation.length ? `Say whether it is fixed, or unknown: ${partNames(noFixation)}.` : 'Say whether each part is fixed, or unknown.',
    },
    {
      id: 'maker',
      section,
      label: 'Maker of each part, or unknown',
      done: noMaker.length === 0,
      weight: 'advice',
      remedy: noMaker.length ? `Give the maker, or write unknown: ${partNames(noMaker)}.` : 'Give the maker of each part, or write unknown.',
    },
    {
      id: 'ground',
      section,
      label: 'How sure you are, and from what',
      done: noGround.length === 0,
      weight: 'advice',
      remedy: noGround.length ? `Say how sure and what it rests on: ${partNames(noGround)}.` : 'Say for each part how sure you are and what it rests on.',
    },
  ];
}

function shellPoints(shells: ImplantPart[], parts: ImplantPart[]): ReadinessItem[] {
  const screws = shells.flatMap((shell) => shell.screws ?? []);
  const liners = parts.filter(({ part }) => part === 'liner');
  const points: ReadinessItem[] = [
    {
      id: 'shell-diameter',
      section,
      label: 'Outer diameter of the shell, or said to be unknown',
      done: shells.every((shell) => said(shell.outerDiameterMm) || saysUnknown(shell.note)),
      weight: 'blocks-posting',
      remedy: 'Give the outer diameter in mm, or write in the note of the shell that it is unknown: the blade’s curve follows it.',
    },
    {
      id: 'liner',
      section,
      label: 'The liner and its kind',
      done: liners.length > 0 && liners.every(({ linerKind }) => said(linerKind)),
      weight: 'blocks-listing',
      remedy: 'List the liner and say its kind, or unknown: constrained and dual-mobility liners come out in their own way.',
    },
    {
      id: 'screws',
      section,
      label: 'Screws of the shell',
      done: shells.every((shell) => said(shell.screwHoles) || said(shell.screws)),
      weight: 'advice',
      remedy: 'Say whether the shell has screw holes, and list the screws seen.',
    },
  ];
  if (screws.length)
    points.push({
      id: 'head-drive',
      section,
      label: 'Head drive of each screw, or unknown',
      done: screws.every(({ headDrive }) => said(headDrive)),
      weight: 'advice',
      remedy: 'Give the head drive, or unknown: the driver must match, or a universal set must be brought.',
    });
  return points;
}

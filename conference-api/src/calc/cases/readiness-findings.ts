import { screenIdentifiers } from '../identifiers/identifier-screen.js';
import type { BoneAndPosition, CaseContent, History, InfectionWorkUp, Patient } from '../vocabulary/case-content.js';
import type { Projection } from '../vocabulary/images.js';
import { caseTexts } from './case-text.js';
import { saysNothing } from './field-words.js';
import type { ReadinessItem } from './readiness.js';

/** 'unknown' said in words, where a value is not to be had. */
export const saysUnknown = (text: string | undefined | null): boolean =>
  /\b(unknown|not known|not (?:yet )?(?:done|taken|measured|available)|illegible)\b/i.test(text ?? '');

const said = (value: unknown) => !saysNothing(value);

export function questionPoints({ heading }: CaseContent): ReadinessItem[] {
  const points: ReadinessItem[] = [
    {
      id: 'title',
      section: 'heading',
      label: 'A short title',
      done: said(heading.title),
      weight: 'blocks-posting',
      remedy: 'Give the case a title that says what it is about, without anything of the person.',
    },
    { id: 'side', section: 'heading', label: 'The side', done: said(heading.side), weight: 'blocks-posting', remedy: 'Say left or right.' },
    {
      id: 'question',
      section: 'heading',
      label: 'The question to the panel',
      done: said(heading.question),
      weight: 'blocks-posting',
      remedy: 'Write what you want the panel to answer.',
    },
  ];
  if (heading.urgency === 'soon' || heading.urgency === 'urgent')
    points.push({
      id: 'urgency-reason',
      section: 'heading',
      label: 'The reason for the urgency',
      done: said(heading.urgencyReason),
      weight: 'blocks-posting',
      remedy: 'Say why it can not wait, or set the urgency to routine.',
    });
  return points;
}

/** Certain identifiers keep a case from being posted: a second person looks for the less certain ones. */
export function textPoints(content: CaseContent): ReadinessItem[] {
  const found = caseTexts(content).filter(({ text }) => screenIdentifiers({ text }).findings.some(({ strength }) => strength === 'certain'));
  return [
    {
      id: 'identifiers',
      section: found[0]?.section ?? 'heading',
      label: 'No sure identifier in the text',
      done: found.length === 0,
      weight: 'blocks-posting',
      remedy: found.length
        ? `Take out what names a person or a day in: ${found.slice(0, 5).map(({ label }) => label).join('; ')}.`
        : 'Take out names, numbers, addresses and calendar dates.',
    },
  ];
}

export function patientPoints(patient: Patient): ReadinessItem[] {
  const section = 'patient' as const;
  return [
    { id: 'age', section, label: 'Age in years', done: said(patient.ageYears), weight: 'blocks-listing', remedy: 'Give the age in completed years; 90 and over is one group.' },
    { id: 'sex', section, label: 'Sex', done: said(patient.sex), weight: 'blocks-listing', remedy: 'Choose one, or not stated.' },
    { id: 'asa', section, label: 'ASA class', done: said(patient.asa), weight: 'blocks-listing', remedy: 'Give the ASA class: anaesthesia judges by it.' },
    {
      id: 'anticoagulation',
      section,
      label: 'Anticoagulation',
      done: said(patient.anticoagulation),
      weight: 'blocks-listing',
      remedy: 'Say which, or none.',
    },
    {
      id: 'allergies',
      section,
      label: 'Allergies to metal, cement and antibiotics',
      done: said(patient.metalAllergy) && said(patient.cementAllergy) && said(patient.antibioticAllergy),
      weight: 'advice',
      remedy: 'Write which, none, or unknown, for each of the three.',
    },
    { id: 'function', section, label: 'Function now', done: said(patient.function), weight: 'advice', remedy: 'Say how far the patient walks and with what.' },
  ];
}

export function historyPoints(history: History): ReadinessItem[] {
  const section = 'history' as const;
  return [
    { id: 'index-diagnosis', section, label: 'Index diagnosis', done: said(history.indexDiagnosis), weight: 'advice', remedy: 'Say why the joint was first replaced.' },
    {
      id: 'index-interval',
      section,
      label: 'Interval since the index operation',
      done: said(history.indexInterval),
      weight: 'advice',
      remedy: 'Write it as an interval, for example 9 years; never a date.',
    },
    { id: 'reason', section, label: 'Reason for revision', done: said(history.reasons), weight: 'blocks-posting', remedy: 'Choose at least one reason.' },
  ];
}

export function infectionPoints(infection: InfectionWorkUp): ReadinessItem[] {
  const section = 'infection' as const;
  const aspirated = said(infection.synovialWbcPerUl) || said(infection.cultures) || saysUnknown(infection.sampling);
  return [
    {
      id: 'suspicion',
      section,
      label: 'Suspicion of infection',
      done: said(infection.suspicion),
      weight: 'blocks-listing',
      remedy: 'Say none, possible or confirmed: the quorum can depend on it.',
    },
    {
      id: 'crp',
      section,
      label: 'CRP, or said to be unknown',
      done: said(infection.crpMgL) || saysUnknown(infection.sampling),
      weight: 'advice',
      remedy: 'Give the CRP in mg/L, or write under sampling that it is unknown. Not known is never the same as negative.',
    },
    {
      id: 'aspiration',
      section,
      label: 'Aspiration: cell count or cultures',
      done: aspirated,
      weight: 'advice',
      remedy: 'Give the cell count or the cultures, or write under sampling that none was taken.',
    },
  ];
}

const DEFECT_FINDINGS: (keyof BoneAndPosition)[] = ['direction', 'ischialLysis', 'teardrop', 'kohler'];

export function bonePoints({ heading, bone }: CaseContent): ReadinessItem[] {
  if (heading.joint === 'knee') return [];
  return [
    {
      id: 'defect-findings',
      section: 'bone',
      label: 'Findings for the defect class',
      done: DEFECT_FINDINGS.every((name) => said(bone[name])),
      weight: 'advice',
      remedy: 'Give migration, ischial lysis, teardrop and Köhler line as read off the images.',
    },
    {
      id: 'readers-class',
      section: 'bone',
      label: 'Your own defect class',
      done: said(bone.readersClass),
      weight: 'advice',
      remedy: 'Give your own class: it stands beside the computed one.',
    },
  ];
}

export function imagePoints(images: readonly Projection[]): ReadinessItem[] {
  return [
    {
      id: 'ap-film',
      section: 'images',
      label: 'An AP film',
      done: images.some((projection) => projection === 'ap-pelvis' || projection === 'ap'),
      weight: 'blocks-posting',
      remedy: 'Add an AP film and set its projection.',
    },
    {
      id: 'second-plane',
      section: 'images',
      label: 'A second plane',
      done: images.some((projection) => projection === 'lateral' || projection === 'oblique' || projection === 'ct'),
      weight: 'advice',
      remedy: 'Add a lateral or oblique view, or CT slices.',
    },
  ];
}

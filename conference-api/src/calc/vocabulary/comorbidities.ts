/** Conditions of the 1987 comorbidity index (Charlson ME et al. J Chronic Dis 1987;40:373), kebab-case. */
export const CHARLSON_CONDITION_WORDS = {
  'myocardial-infarction': 'Myocardial infarction',
  'congestive-heart-failure': 'Congestive heart failure',
  'peripheral-vascular-disease': 'Peripheral vascular disease',
  'cerebrovascular-disease': 'Cerebrovascular disease',
  dementia: 'Dementia',
  'chronic-pulmonary-disease': 'Chronic pulmonary disease',
  'connective-tissue-disease': 'Connective tissue disease',
  'ulcer-disease': 'Ulcer disease',
  'mild-liver-disease': 'Mild liver disease',
  diabetes: 'Diabetes',
  hemiplegia: 'Hemiplegia',
  'moderate-or-severe-renal-disease': 'Moderate or severe renal disease',
  'diabetes-with-end-organ-damage': 'Diabetes with end-organ damage',
  'any-tumor': 'Any tumour',
  leukemia: 'Leukaemia',
  lymphoma: 'Lymphoma',
  'moderate-or-severe-liver-disease': 'Moderate or severe liver disease',
  'metastatic-solid-tumor': 'Metastatic solid tumour',
  aids: 'AIDS',
} as const;
export type CharlsonCondition = keyof typeof CHARLSON_CONDITION_WORDS;
export const CHARLSON_CONDITION_NAMES = Object.keys(CHARLSON_CONDITION_WORDS) as CharlsonCondition[];

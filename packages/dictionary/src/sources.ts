/** Where definitions and limits come from, each worded once. "From memory" marks what a clinician should confirm. */
export const sources = {
  registry: 'This registry',
  entryLimit: 'Common field of a training record; limits set by this registry to catch entry errors',
  customary: 'Common practice in the field, from memory; limits set by this registry to catch entry errors',
  isncsci: 'ISNCSCI, 2019 revision (Rupp et al. Top Spinal Cord Inj Rehabil 2021;27(2):1-22)',
  tags: 'ISNCSCI, 2019 revision: scores affected by a condition other than the injury (Rupp et al., doi 10.1038/s41393-021-00646-0)',
  coreDataSet: 'International SCI Core Data Set 3.0 (Spinal Cord 2023;61:65-68)',
  dataUseOntology: 'GA4GH Data Use Ontology, release 2021-02-23, CC BY 4.0',
  gagnon: 'Gagnon et al. J Neuroeng Rehabil 2018, doi 10.1186/s12984-018-0354-2; limits set by this registry to catch entry errors',
  wu: 'Wu et al. J Neuroeng Rehabil 2018;15, doi 10.1186/s12984-018-0355-1; limits set by this registry to catch entry errors',
  khan: 'Khan et al. J Neuroeng Rehabil 2019, doi 10.1186/s12984-019-0585-x; limits set by this registry to catch entry errors',
  hypotension: 'Freeman et al. consensus 2011, as quoted in Physiol Rep 2020;8:e14617',
  dysreflexia: 'Teasell 2000 as quoted in a rehabilitation evidence review; autonomic standard from memory',
  safeHarbor: '45 CFR 164.514(b)(2)(i)(C): ages over 89 form one class',
  eventGrading: 'Common trial grading of adverse events, from memory',
} as const;

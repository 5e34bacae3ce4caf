/** The invented laboratories and systems of the demonstration. No such laboratory, person, protein or ligand exists. */
import type { Contributor } from '@/schemas/dataset-1.generated';
import type { LabSlug } from './recipe';

/** Opens the abstract of every document of the scenario. */
export const INVENTED =
  'Invented for the demonstration: laboratory, people, protein, ligands and every number are made up.';

export const LABORATORIES: { slug: LabSlug; name: string; institution: string }[] = [
  { slug: 'halvorn-biophysics', name: 'Halvorn Biophysics', institution: 'Halvorn University (invented)' },
  {
    slug: 'norrel-receptor-group',
    name: 'Norrel Receptor Group',
    institution: 'Norrel School of Membranes (invented)',
  },
  { slug: 'quillan-institute', name: 'Quillan Institute', institution: 'Quillan Institute (invented)' },
  { slug: 'ostrel-enzymology', name: 'Ostrel Enzymology', institution: 'Polytechnic of Ostrel (invented)' },
  { slug: 'sunder-lab', name: 'Sunder Lab', institution: 'Sunder Coast College (invented)' },
];

export const SYSTEMS: { slug: string; name: string; protein: string; ligands: string[] }[] = [
  { slug: 'alrq-velline', name: 'AlrQ · velline', protein: 'AlrQ', ligands: ['velline'] },
  {
    slug: 'tessin-ocarate',
    name: 'Tessin channel · ocarate',
    protein: 'Tessin channel',
    ligands: ['ocarate', 'selnate'],
  },
  { slug: 'merv-halide', name: 'MerV · halide', protein: 'MerV', ligands: ['halide'] },
  {
    slug: 'farx-adenol-cessate',
    name: 'FarX · adenol, cessate',
    protein: 'FarX',
    ligands: ['adenol', 'cessate'],
  },
];

export const CONTRIBUTORS: Record<LabSlug, Contributor[]> = {
  'halvorn-biophysics': [
    { name: 'Orla Brennivar', roles: ['Conceptualization', 'Formal analysis', 'Writing – original draft'] },
    { name: 'Tam Halvoressen', roles: ['Investigation', 'Methodology'] },
  ],
  'norrel-receptor-group': [
    { name: 'Imre Tasselmoor', roles: ['Investigation', 'Formal analysis'] },
    { name: 'Wenna Norrelby', roles: ['Supervision', 'Funding acquisition'] },
  ],
  'quillan-institute': [
    { name: 'Ulf Quendray', roles: ['Investigation', 'Validation'] },
    { name: 'Sefa Marrowick', roles: ['Data curation', 'Software'] },
  ],
  'ostrel-enzymology': [
    { name: 'Pavo Ostrelund', roles: ['Investigation', 'Resources'] },
    { name: 'Jin Kettlevane', roles: ['Methodology', 'Visualization'] },
  ],
  'sunder-lab': [
    { name: 'Maren Sundervale', roles: ['Conceptualization', 'Investigation', 'Formal analysis'] },
  ],
};

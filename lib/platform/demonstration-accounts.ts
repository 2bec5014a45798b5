/**
 * The demonstration's people, all invented. Their passwords are public by intent: they stand on the demonstration's
 * accounts page, and demonstration data never goes into a database of one's own.
 */
export interface DemonstrationAccount {
  key: string;
  name: string;
  email: string;
  password: string;
  role: 'member' | 'moderator' | 'admin';
  region: string;
}

const account = (
  key: string,
  name: string,
  region: string,
  role: DemonstrationAccount['role'] = 'member',
): DemonstrationAccount => ({
  key,
  name,
  email: `${key}@orrin-skerry.example`,
  password: `${key}-keeps-the-lamp-lit`,
  role,
  region,
});

export const DEMONSTRATION_ACCOUNTS: readonly DemonstrationAccount[] = [
  account('runa', 'Runa Ostley', 'Harbour', 'admin'),
  account('nessa', 'Nessa Quill', 'Harbour', 'moderator'),
  account('halvard', 'Halvard Strand', 'North Head', 'moderator'),
  account('ina', 'Ina Tolvers', 'Harbour'),
  account('marten', 'Marten Askeland', 'The Croft'),
  account('orla', 'Orla Fenn', 'North Head'),
  account('bram', 'Bram Hollis', 'The Croft'),
  account('sunniva', 'Sunniva Reke', 'Kirk Hill'),
  account('teague', 'Teague Corran', 'Harbour'),
  account('wilma', 'Wilma Sandoe', 'Kirk Hill'),
  account('jorun', 'Jorun Pike', 'South Sound'),
  account('eskil', 'Eskil Marrow', 'South Sound'),
  account('tilda', 'Tilda Vance-Oyelaran of the Upper Lighthouse Cottages', 'North Head'),
  account('corin', 'Corin Saltmarsh', 'Harbour'),
];

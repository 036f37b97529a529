/** The invented people of the demonstration. Addresses are on domains reserved for examples. */

export const PASSWORD = 'winter larder demo'

export const staff = [
  { role: 'admin', name: 'Ines Calder', email: 'ines.calder@frostbell.example.com' },
  { role: 'rep', name: 'Tobias Renn', email: 'tobias.renn@frostbell.example.com' },
  { role: 'clerk', name: 'Odile Marsh', email: 'odile.marsh@frostbell.example.com' },
  { role: 'warehouse', name: 'Kofi Anders', email: 'kofi.anders@frostbell.example.com' },
] as const

export const organizers = [
  { role: 'lead', name: 'Ms. Abara', email: 'n.abara@saltmarsh.example.org' },
  { role: 'treasurer', name: 'Paul Whitlock', email: 'p.whitlock@saltmarsh.example.org' },
  { role: 'helper', name: 'Dana Ruiz', email: 'd.ruiz@saltmarsh.example.org' },
] as const

/** The leads of the two other drives. */
export const otherLeads = {
  juniper: { name: 'Harriet Bloom', email: 'h.bloom@juniperflats.example.org' },
  windward: { name: 'Keoni Palakiko', email: 'k.palakiko@windward.example.org' },
}

export const guardians = [
  {
    name: 'Karin Lindqvist',
    email: 'karin.lindqvist@example.com',
    sellers: [
      ['Maya', 'Lindqvist'],
      ['Nils', 'Lindqvist'],
    ],
  },
  { name: "Sean O'Brien", email: 'sean.obrien@example.com', sellers: [['Zoë', "O'Brien"]] },
] as const

export const crews = ['Chassis', 'Lift', 'Code', 'Outreach']

/** Twelve to a crew, in this order; two of them are "Maya L." in public and must never swap boxes. */
export const saltmarshSellers: [first: string, last: string][] = [
  ['Maya', 'Lindqvist'],
  ['Andre', 'Baptiste'],
  ['Priya', 'Nair'],
  ['Wyatt', 'Colburn'],
  ['Lena', 'Hoffmann'],
  ['Joaquín', 'Peralta'],
  ['Amina', 'Yusuf'],
  ['Caleb', 'Stroud'],
  ['Mei', 'Tanaka'],
  ['Rory', 'Gallagher'],
  ['Sofia', 'Marchetti'],
  ['Theo', 'Vance'],
  ['Nils', 'Lindqvist'],
  ['Anh', 'Nguyễn'],
  ['Łukasz', 'Żółć'],
  ['Ivy', 'Prescott'],
  ['Omar', 'Haddad'],
  ['Greta', 'Svensson'],
  ['Jonah', 'Weiss'],
  ['Camila', 'Duarte'],
  ['Ezra', 'Tillman'],
  ['Hana', 'Kovář'],
  ['Miles', 'Okafor'],
  ['Ruthie', 'Blackwood'],
  ['Zoë', "O'Brien"],
  ['Kai', 'Nakamura'],
  ['Delia', 'Fontaine'],
  ['Marcus', 'Bell'],
  ['Anya', 'Petrova'],
  ['Simon', 'Achebe'],
  ['Noor', 'Rahman'],
  ['Felix', 'Aldana'],
  ['Tessa', 'Wright'],
  ['Idris', 'Cole'],
  ['Paloma', 'Reyes'],
  ['Owen', 'Fairchild'],
  ['Maya', 'Lorimer'],
  ['Dmitri', 'Volkov'],
  ['Chloe', 'Anderssen'],
  ['Rafael', 'Montoya'],
  ['Esther', 'Goldman'],
  ['Jasper', 'Quill'],
  ['Leila', 'Farahani'],
  ['Brandon', 'Oyelaran'],
  ['Nadia', 'Kowalska'],
  ['Peter', 'Sandoval'],
  ['Willa', 'Thornton'],
  ['Yusuf', 'Demir'],
]

const firsts = [
  'Ava',
  'Ben',
  'Cora',
  'Dev',
  'Elsa',
  'Finn',
  'Gia',
  'Hugo',
  'Iris',
  'Jude',
  'Kira',
  'Leo',
  'Mina',
  'Nico',
  'Opal',
  'Quinn',
  'Rosa',
  'Sami',
  'Tova',
  'Uma',
]
const lasts = [
  'Ashdown',
  'Brightwater',
  'Castillo',
  'Dunmore',
  'Eriksen',
  'Fairley',
  'Grady',
  'Holm',
  'Ishida',
  'Jarrett',
  'Keane',
  'Lowell',
  'Moreau',
]

/** As many invented names as are asked for, always the same ones. */
export function inventNames(count: number): [string, string][] {
  return Array.from({ length: count }, (_, n) => [
    firsts[n % firsts.length]!,
    lasts[(n * 7 + Math.floor(n / 20)) % lasts.length]!,
  ])
}

export const juniperClasses = ['Room 11', 'Room 12', 'Room 14', 'Room 21', 'Room 22']
export const windwardSquads = ['Minnows', 'Currents', 'Breakers']

/** Those who order: name and how they know the seller. */
export const customers: [name: string, relationship: string][] = [
  ['Ruth Lindqvist', 'grandparent'],
  ['Grandma Ruth', 'grandparent'],
  ['Mr. Petrov', 'neighbor'],
  ['Ana Marisol Vega', 'relative'],
  ['Uncle Bjorn', 'relative'],
  ['Theresa Okonkwo', 'coworker'],
  ['The Hallorans', 'neighbor'],
  ['Papa Joe', 'grandparent'],
  ['Linh Tran', 'friend'],
  ['Coach Barrera', 'school_staff'],
  ['Nana Elise', 'grandparent'],
  ['Walter Grimshaw', 'neighbor'],
  ['Aunt Fatima', 'relative'],
  ['Bianca Rossi', 'friend'],
  ['Desmond Clarke', 'coworker'],
  ['Mr. and Mrs. Ito', 'neighbor'],
  ['Sigrid Dahl', 'relative'],
  ['Carmen Ybarra', 'friend'],
  ['Grandpa Lou', 'grandparent'],
  ['Nurse Kelleher', 'school_staff'],
  ['Xavier Monroe', 'coworker'],
  ['Mirela Ionescu', 'friend'],
  ['Great-aunt Pearl', 'relative'],
  ['Hank Dewitt', 'neighbor'],
]

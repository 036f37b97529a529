import type { Relationship } from '#shared/orders/contract.ts'

/** The invented people of the demonstration. Addresses are on domains reserved for examples, telephones on 555-01xx. */

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

export type DemoGuardian = {
  name: string
  email: string
  phone: string
  /** Whose guardian, by name on Saltmarsh's roster. */
  sellers: readonly (readonly [firstName: string, lastName: string])[]
}

export const guardians: readonly DemoGuardian[] = [
  {
    name: 'Karin Lindqvist',
    email: 'karin.lindqvist@example.com',
    phone: '(207) 555-0118',
    sellers: [
      ['Maya', 'Lindqvist'],
      ['Nils', 'Lindqvist'],
    ],
  },
  {
    name: "Maeve O'Brien",
    email: 'maeve.obrien@example.com',
    phone: '(207) 555-0143',
    sellers: [['Zoë', "O'Brien"]],
  },
]

export type DemoSeller = {
  /** Three digits, unique in the drive. */
  number: number
  firstName: string
  lastName: string
  group: string
}

const FIRST_NUMBER = 101

/** Numbers the sellers through, group after group. A first name is one word; the rest is the last name. */
function roster(groups: readonly (readonly [group: string, names: readonly string[]])[]): DemoSeller[] {
  return groups
    .flatMap(([group, names]) => names.map(name => ({ group, name })))
    .map(({ group, name }, place) => {
      const [firstName = '', ...rest] = name.split(' ')
      return { number: FIRST_NUMBER + place, firstName, lastName: rest.join(' '), group }
    })
}

const list = (names: string) => names.split(', ')

/** Twelve to a crew; two of them are "Maya L." in public and must never swap boxes. */
export const saltmarshSellers: readonly DemoSeller[] = roster([
  [
    'Chassis',
    list(
      'Maya Lindqvist, Andre Baptiste, Priya Nair, Wyatt Colburn, Lena Hoffmann, Joaquín Peralta, ' +
        'Amina Yusuf, Caleb Stroud, Mei Tanaka, Rory Gilhooly, Sofia Marchetti, Theo Vance',
    ),
  ],
  [
    'Lift',
    list(
      'Nils Lindqvist, Anh Nguyễn, Łukasz Wójcik, Ivy Prescott, Omar Haddad, Greta Svensson, ' +
        'Jonah Weiss, Camila Duarte, Ezra Tillman, Hana Kovář, Miles Okafor, Ruthie Blackwood',
    ),
  ],
  [
    'Code',
    list(
      "Zoë O'Brien, Kai Nakamura, Delia Fontaine, Marcus Bellweather, Anya Petrova, Simon Achterberg, " +
        'Noor Rahman, Felix Aldana, Tessa Wainwright, Idris Coleman, Paloma Reyes, Owen Fairchild',
    ),
  ],
  [
    'Outreach',
    list(
      'Maya Lorimer, Dmitri Zelenko, Chloe Anderssen, Rafael Montoya, Esther Goldblum, Jasper Quill, ' +
        'Leila Farzan, Brandon Oyelaran, Nadia Kowalska, Peter Sandoval, Willa Thornbury, Yusuf Demirel',
    ),
  ],
])
export const crews: readonly string[] = groupsOf(saltmarshSellers)

const juniperFirstNames = list(
  'Ava, Ben, Cora, Dev, Elsa, Finn, Gia, Hugo, Iris, Jude, Kira, Leo, Mina, Nico, Opal, Percy, Quinn, Rosa, ' +
    'Sami, Tova, Uma, Viktor, Wren, Ximena, Yara, Zane, Aziz, Bea, Cruz, Dalia, Elio, Freya, Gus, Hania, ' +
    'Ivo, June, Kofi, Lupe, Moss, Noa',
)
const juniperLastNames = list(
  'Ashdown, Brightwater, Castillo, Dunmore, Eriksen, Fairley, Begaye, Holm, Ishida, Jarrett, Keane, Lowell, ' +
    'Moreau, Nakai, Ocampo, Pruitt, Quintana, Rasmussen, Saldívar, Tso, Underhill, Vasquez, Whitehorse, ' +
    'Yellowhair, Zamora, Abubakar, Brandt, Chaudhry, Delacroix, Espinoza, Friis, Guerrero, Hollis, Ivanova, ' +
    'Joubert, Kapoor, Lindgren, Mbele-Ross, Nuñez, Oyama',
)

/** Twenty-four to a class; the last names step so that no full name comes twice. */
export const juniperSellers: readonly DemoSeller[] = roster(
  list('Room 11, Room 12, Room 14, Room 21, Room 22').map((room, group) => [
    room,
    Array.from({ length: 24 }, (_, n) => {
      const place = group * 24 + n
      const last = (place * 7 + Math.floor(place / 40) * 13) % juniperLastNames.length
      return `${juniperFirstNames[place % juniperFirstNames.length]} ${juniperLastNames[last]}`
    }),
  ]),
)
export const juniperClasses: readonly string[] = groupsOf(juniperSellers)

export const windwardSellers: readonly DemoSeller[] = roster([
  [
    'Minnows',
    list(
      'Leilani Kahale, Noah Ferreira, Emi Sakamoto, Kawika Nohea, Talia Brandvold, Mateo Agbayani, ' +
        'Suki Yamashiro, Bodhi Larkspur, Malia Keawe, Jun Pascua',
    ),
  ],
  [
    'Currents',
    list(
      'Nalu Kamealoha, Hazel Ito, Rafe Medeiros, Lani Okimoto, Søren Bakke, Pua Hanohano, ' +
        'Aiko Shimabuku, Declan Roarke, Tevita Fonoti, Isla Cabrera',
    ),
  ],
  [
    'Breakers',
    list(
      'Keahi Makoa, Naomi Uchida, Gabriel Souza, Hina Palea, Arlo Westergaard, Mele Taufa, ' +
        'Ren Higashi, Piper Ainsley, Koa Lindsey, Marisol Tolentino',
    ),
  ],
])
export const windwardSquads: readonly string[] = groupsOf(windwardSellers)

function groupsOf(sellers: readonly DemoSeller[]): string[] {
  return [...new Set(sellers.map(({ group }) => group))]
}

export type DemoCustomer = { name: string; relationship: Relationship; email: string }

const customerNames: Record<Exclude<Relationship, 'other'>, string[]> = {
  grandparent: list(
    'Ruth Lindqvist, Grandma Ruth, Papa Joe, Nana Elise, Grandpa Lou, Bà Hạnh Nguyễn, Babcia Halina Wójcik, ' +
      'Abuela Carmen Peralta, Oma Trudi Hoffmann, Grandma Odette Baptiste, Halmoni Sook-ja Yoon',
  ),
  parent: list("Karin Lindqvist, Maeve O'Brien, Quang Nguyễn, Sunita Nair, Emeka Okafor, Teresa Montoya"),
  relative: list(
    'Ana Marisol Vega, Uncle Bjorn, Aunt Fatima, Sigrid Dahl, Great-aunt Pearl, Cousin Ignacio Duarte, ' +
      'Aunt Siobhán, Uncle Tadeusz, Rosalind Fairchild, Yuki Nakamura-Hale, Uncle Efraín',
  ),
  neighbor: list(
    'Mr. Petrov, The Hallorans, Walter Grimshaw, Mr. and Mrs. Ito, Hank Dewitt, Winifred Oakes, ' +
      'Zdeněk Havelka, Mrs. Appiah, Lorraine Pettibone, The Castellanos family, Zoë van der Meer',
  ),
  friend: list(
    'Linh Trần, Bianca Rosetti, Carmen Ybarra, Mirela Ionescu, Håkon Nygård, Josephine Tull, ' +
      'Amadou Diallo-Reed, Beatriz Couto, Françoise Leclair, Wendell Pike',
  ),
  coworker: list(
    'Theresa Okonkwo, Desmond Clarkson, Xavier Monroe, Ngozi Umeh, Radhika Menon, Colm Dunleavy, ' +
      'Ingrid Thorsen, Gwendolyn Batts, Tomasz Zieliński, Pilar Echeverría',
  ),
  school_staff: list('Coach Barrera, Nurse Kelleher, Mr. Odom, Ms. Tsosie, Librarian Agnes Pell'),
}

/** Those who order, each with how they know the seller. */
export const customers: readonly DemoCustomer[] = (
  Object.keys(customerNames) as (keyof typeof customerNames)[]
).flatMap(relationship =>
  customerNames[relationship].map((name, place) => ({
    name,
    relationship,
    email: `${mailbox(name)}@example.${(['com', 'net', 'org'] as const)[place % 3]}`,
  })),
)

/** "Łukasz O'Brien" as the part of an address before the @, which is plain ASCII. */
function mailbox(name: string): string {
  return name
    .toLowerCase()
    .replaceAll(/[łøđ]/g, letter => ({ ł: 'l', ø: 'o', đ: 'd' })[letter] ?? letter)
    .normalize('NFD')
    .replaceAll(/[\p{M}'.]/gu, '')
    .replaceAll(/[^a-z]+/g, '.')
}

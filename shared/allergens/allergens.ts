/**
 * The nine major allergens of US law, and for tree nuts, fish and crustacean shellfish the species, which a
 * statement must name. Coconut is not among the tree nuts.
 */
export const majors = [
  'milk',
  'egg',
  'fish',
  'crustacean',
  'tree_nut',
  'wheat',
  'peanut',
  'soy',
  'sesame',
] as const
export type Major = (typeof majors)[number]

export const treeNuts = [
  'almond',
  'black_walnut',
  'brazil_nut',
  'california_walnut',
  'cashew',
  'hazelnut',
  'heartnut',
  'macadamia',
  'pecan',
  'pine_nut',
  'pistachio',
  'walnut',
] as const
export const fishSpecies = ['anchovy', 'cod', 'haddock', 'pollock', 'salmon', 'tuna'] as const
export const crustaceanSpecies = ['crab', 'lobster', 'shrimp'] as const

type Simple = Exclude<Major, 'tree_nut' | 'fish' | 'crustacean'>

export type Allergen =
  | Simple
  | `tree_nut:${(typeof treeNuts)[number]}`
  | `fish:${(typeof fishSpecies)[number]}`
  | `crustacean:${(typeof crustaceanSpecies)[number]}`

const simple = majors.filter((major): major is Simple => !['tree_nut', 'fish', 'crustacean'].includes(major))

/** Every allergen a statement may name, in the order statements use. */
export const allergens: readonly Allergen[] = [
  ...simple.filter(name => name === 'wheat'),
  ...simple.filter(name => name === 'milk'),
  ...simple.filter(name => name === 'egg'),
  ...simple.filter(name => name === 'soy'),
  ...simple.filter(name => name === 'peanut'),
  ...treeNuts.map(species => `tree_nut:${species}` as const),
  ...simple.filter(name => name === 'sesame'),
  ...fishSpecies.map(species => `fish:${species}` as const),
  ...crustaceanSpecies.map(species => `crustacean:${species}` as const),
]

const places = new Map<string, number>(allergens.map((name, place) => [name, place]))

export function isAllergen(text: string): text is Allergen {
  return places.has(text)
}

export function majorOf(allergen: Allergen): Major {
  return allergen.split(':')[0] as Major
}

export type AllergenStatement = {
  contains: readonly string[]
  /** Somebody confirmed that the empty list is meant. */
  containsNone: boolean
  mayContain: readonly string[]
}

/** Allergens without repeats in the order of statements; what may be in something that contains it goes without saying. */
export function unionStatement(statements: readonly AllergenStatement[]): AllergenStatement {
  const contains = sorted(statements.flatMap(statement => statement.contains))
  return {
    contains,
    containsNone:
      contains.length === 0 && statements.length > 0 && statements.every(statement => statement.containsNone),
    mayContain: sorted(statements.flatMap(statement => statement.mayContain)).filter(
      name => !contains.includes(name),
    ),
  }
}

export function sorted(names: readonly string[]): string[] {
  return [...new Set(names)].sort((a, b) => (places.get(a) ?? 999) - (places.get(b) ?? 999))
}

/** Why a statement cannot stand: an item with one of these is not offered. */
export type StatementProblem = 'unconfirmed_empty' | 'species_missing' | 'unknown_allergen' | 'contradiction'

export function statementProblems(statement: AllergenStatement): StatementProblem[] {
  const problems = new Set<StatementProblem>()
  for (const name of [...statement.contains, ...statement.mayContain]) {
    if (['tree_nut', 'fish', 'crustacean'].includes(name)) problems.add('species_missing')
    else if (!isAllergen(name)) problems.add('unknown_allergen')
  }
  if (statement.contains.length === 0 && !statement.containsNone) problems.add('unconfirmed_empty')
  if (statement.contains.length > 0 && statement.containsNone) problems.add('contradiction')
  return [...problems]
}

/**
 * Whether somebody who avoids these majors does not want to see the item; "tree nuts" covers every species. A
 * statement that cannot stand hides the item from everybody who avoids anything: what is unknown is not safe.
 */
export function isHidden(
  statement: AllergenStatement,
  avoid: readonly Major[],
  options: { alsoMayContain: boolean },
): boolean {
  if (avoid.length > 0 && statementProblems(statement).length > 0) return true
  const names = options.alsoMayContain ? [...statement.contains, ...statement.mayContain] : statement.contains
  return names.some(name => isAllergen(name) && avoid.includes(majorOf(name)))
}

import type { CategorySlug, DemoItem } from './demo-item.ts'
import { breadsAndPretzels } from './larder/breads-and-pretzels.ts'
import { breakfast } from './larder/breakfast.ts'
import { dumplings } from './larder/dumplings.ts'
import { handPies } from './larder/hand-pies.ts'
import { soupsAndChowders } from './larder/soups-and-chowders.ts'
import { sweetsAndDoughs } from './larder/sweets-and-doughs.ts'

/** The categories in the order of the printed catalog. */
export const categories: readonly { slug: CategorySlug; en: string; es: string }[] = [
  { slug: 'soups_and_chowders', en: 'Soups and chowders', es: 'Sopas y cremas' },
  { slug: 'hand_pies', en: 'Hand pies', es: 'Empanadas' },
  { slug: 'dumplings', en: 'Dumplings', es: 'Dumplings' },
  { slug: 'breads_and_pretzels', en: 'Breads and pretzels', es: 'Panes y pretzels' },
  { slug: 'breakfast', en: 'Breakfast', es: 'Desayuno' },
  { slug: 'sweets_and_doughs', en: 'Sweets and doughs', es: 'Dulces y masas' },
]

/** The Winter Larder of Frostbell Provisions: four frozen items in each of six categories. */
export const winterLarder: DemoItem[] = [
  ...soupsAndChowders,
  ...handPies,
  ...dumplings,
  ...breadsAndPretzels,
  ...breakfast,
  ...sweetsAndDoughs,
]

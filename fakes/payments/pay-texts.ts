import type { DeclineReason } from './cards.ts'

export type Language = 'en' | 'es'
export type Field = 'number' | 'expiry' | 'code' | 'name'
export type FieldProblem =
  | DeclineReason
  | 'number_missing'
  | 'expiry_form'
  | 'expiry_past'
  | 'code_form'
  | 'name_missing'

type Texts = {
  service: string
  notice: string
  noticeMore: string
  due: string
  pay: (amount: string) => string
  labels: Record<Field, string>
  hints: Record<Exclude<Field, 'name'>, string>
  back: string
  order: string
  total: string
  closesIn: (minutes: number) => string
  numbers: string
  outcomes: { number: string; outcome: string }[]
  errorTitle: string
  problemHeading: string
  problems: Record<FieldProblem, string>
  paid: { title: string; text: string; link: string }
  expired: { title: string; text: string; link: string }
  unknown: { title: string; text: string }
}

/** With spaces that do not break, so that the number stays on one line. */
const TEST_NUMBER = '4242\u00a04242\u00a04242\u00a04242'
const TEST_NUMBERS = [
  TEST_NUMBER,
  '4000 0000 0000 0002',
  '4000 0000 0000 9995',
  '4000 0000 0000 0069',
  '4000 0000 0000 0127',
  '4000 0000 0000 0119',
]
const outcomes = (texts: string[]) => TEST_NUMBERS.map((number, at) => ({ number, outcome: texts[at]! }))

export const TEXTS: Record<Language, Texts> = {
  en: {
    service: 'Payment stand-in',
    notice: 'Demonstration.',
    noticeMore:
      'This page stands in for a payment service. It charges nobody; please do not type a real card.',
    due: 'To pay',
    pay: amount => `Pay ${amount}`,
    labels: { number: 'Card number', expiry: 'Expiry', code: 'Security code', name: 'Name on card' },
    hints: {
      number: `Type ${TEST_NUMBER} here`,
      expiry: 'Month and year, as 08/30',
      code: 'Any three digits',
    },
    back: 'Go back to the store',
    order: 'What you are paying for',
    total: 'Total',
    closesIn: minutes =>
      minutes === 1 ? 'This page closes in a minute.' : `This page closes in ${minutes} minutes.`,
    numbers: 'Numbers to try',
    outcomes: outcomes([
      'is accepted',
      'is declined',
      'has too little money',
      'has expired',
      'has another security code',
      'cannot be processed',
    ]),
    errorTitle: 'Not paid yet',
    problemHeading: 'The payment did not go through',
    problems: {
      declined:
        'The card was declined. Nothing was charged. Try another card, or ask the bank that issued this one.',
      insufficient_funds: 'There is not enough money on this card. Nothing was charged. Try another card.',
      expired_card: 'This card has expired. Nothing was charged. Check the expiry, or try another card.',
      incorrect_cvc:
        'The security code does not match this card. Nothing was charged. Check the code and try again.',
      processing_error:
        'The card could not be processed just now. Nothing was charged. Wait a moment, then press Pay again.',
      not_a_number: 'This is not a card number: a digit is wrong or missing. Check it and try again.',
      not_a_test_card:
        'Only demonstration numbers work here, and this is not one of them. It was not kept. Use 4242 4242 4242 4242.',
      number_missing: 'Type the card number.',
      expiry_form: 'Type the expiry as month and year, for example 08/30.',
      expiry_past: 'This expiry is in the past. Check it, or try another card.',
      code_form: 'Type the three or four digits of the security code.',
      name_missing: 'Type the name on the card.',
    },
    paid: {
      title: 'This order is paid',
      text: 'Nothing more is needed here, and nothing was charged twice.',
      link: 'Go to your receipt',
    },
    expired: {
      title: 'This payment page has expired',
      text: 'Nothing was charged. If you still want the order, go back to the store and place it again.',
      link: 'Go back to the store',
    },
    unknown: { title: 'There is no payment page here', text: 'Check the address, or go back to the store.' },
  },
  es: {
    service: 'Pago de demostración',
    notice: 'Demostración.',
    noticeMore:
      'Esta página reemplaza a un servicio de pago. No cobra a nadie; no escriba una tarjeta real, por favor.',
    due: 'A pagar',
    pay: amount => `Pagar ${amount}`,
    labels: {
      number: 'Número de tarjeta',
      expiry: 'Vencimiento',
      code: 'Código de seguridad',
      name: 'Nombre en la tarjeta',
    },
    hints: {
      number: `Escriba aquí ${TEST_NUMBER}`,
      expiry: 'Mes y año, como 08/30',
      code: 'Tres dígitos cualesquiera',
    },
    back: 'Volver a la tienda',
    order: 'Lo que está pagando',
    total: 'Total',
    closesIn: minutes =>
      minutes === 1 ? 'Esta página se cierra en un minuto.' : `Esta página se cierra en ${minutes} minutos.`,
    numbers: 'Números para probar',
    outcomes: outcomes([
      'se acepta',
      'se rechaza',
      'no tiene fondos suficientes',
      'está vencida',
      'tiene otro código de seguridad',
      'no se puede procesar',
    ]),
    errorTitle: 'Aún sin pagar',
    problemHeading: 'El pago no se realizó',
    problems: {
      declined:
        'La tarjeta fue rechazada. No se cobró nada. Pruebe con otra tarjeta o pregunte al banco que la emitió.',
      insufficient_funds:
        'Esta tarjeta no tiene fondos suficientes. No se cobró nada. Pruebe con otra tarjeta.',
      expired_card:
        'Esta tarjeta está vencida. No se cobró nada. Revise el vencimiento o pruebe con otra tarjeta.',
      incorrect_cvc:
        'El código de seguridad no corresponde a esta tarjeta. No se cobró nada. Revise el código e intente de nuevo.',
      processing_error:
        'La tarjeta no se pudo procesar en este momento. No se cobró nada. Espere un momento y pulse Pagar de nuevo.',
      not_a_number:
        'Este no es un número de tarjeta: falta un dígito o hay uno equivocado. Revíselo e intente de nuevo.',
      not_a_test_card:
        'Aquí solo funcionan los números de demostración, y este no lo es. No se guardó. Use 4242 4242 4242 4242.',
      number_missing: 'Escriba el número de tarjeta.',
      expiry_form: 'Escriba el vencimiento como mes y año, por ejemplo 08/30.',
      expiry_past: 'Este vencimiento ya pasó. Revíselo o pruebe con otra tarjeta.',
      code_form: 'Escriba los tres o cuatro dígitos del código de seguridad.',
      name_missing: 'Escriba el nombre en la tarjeta.',
    },
    paid: {
      title: 'Este pedido está pagado',
      text: 'Aquí no hace falta nada más, y no se cobró dos veces.',
      link: 'Ir a su recibo',
    },
    expired: {
      title: 'Esta página de pago ha vencido',
      text: 'No se cobró nada. Si todavía quiere el pedido, vuelva a la tienda y hágalo de nuevo.',
      link: 'Volver a la tienda',
    },
    unknown: {
      title: 'Aquí no hay ninguna página de pago',
      text: 'Revise la dirección o vuelva a la tienda.',
    },
  },
}

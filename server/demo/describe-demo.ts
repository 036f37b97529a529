import { demoLinks } from './demo-ids.ts'
import { guardians, organizers, PASSWORD, staff } from './people.ts'

/** What is printed once the demonstration runs: where it is, who can sign in, which links to open. */
export function describeDemo(env: Record<string, string | undefined>): string {
  const site = env.PUBLIC_URL ?? `http://localhost:${env.PORT}`
  const row = (name: string, text: string) => `  ${name.padEnd(34)}${text}`
  const store = (token: string) => `${site}/s/${token}`
  return [
    '',
    'Tallykin is running. Everything in it is invented; no card is charged, no mail leaves this machine.',
    '',
    row('Tallykin', site),
    row('Payment stand-in', `http://localhost:${env.PAYMENT_PORT}`),
    row('Mail catcher', `http://localhost:${env.MAIL_HTTP_PORT}`),
    '',
    'Store links',
    row("Maya L.'s store, open", store(demoLinks.maya)),
    row("Anh N.'s store, open", store(demoLinks.anh)),
    row("Zoë O.'s store, open", store(demoLinks.zoe)),
    row('Paused by the family', store(demoLinks.paused)),
    row('Closed (Juniper Flats)', store(demoLinks.closed)),
    row('Not yet open (Windward Point)', store(demoLinks.notOpen)),
    row('Group link (Chassis crew)', store(demoLinks.group)),
    '',
    `Sign-ins at ${site}/sign-in, password "${PASSWORD}"`,
    ...staff.map(person => row(`${person.name}, ${person.role}`, person.email)),
    ...organizers.map(person => row(`${person.name}, ${person.role}`, person.email)),
    ...guardians.map(person => row(`${person.name}, guardian`, person.email)),
    'Staff, leads and treasurers are asked for a code as well; the mail catcher shows the codes of now.',
    '',
    'Pay with card 4242 4242 4242 4242, any later expiry and any code. Ctrl-C stops everything.',
    '',
    '',
  ].join('\n')
}

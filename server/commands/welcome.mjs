/** The demo people, in the order of the job; their passwords are of this data folder and stand nowhere else. */
export const DEMO_PEOPLE = [
  { name: 'Ines Halloran', email: 'ines@tansyquay.example', role: 'designer, shop admin' },
  { name: 'Bo Tremaine', email: 'bo@tansyquay.example', role: 'installer' },
  { name: 'Priya Castellane', email: 'priya@tansyquay.example', role: 'reviewer' },
  { name: 'Walt Ostrander', email: 'walt@tansyquay.example', role: 'owner' },
];

export function printWelcome({ settings, database, secrets, dataFolder }) {
  const lines = ['', `Ampwright is ready at  ${settings.address}`, ''];
  if (database === undefined) {
    lines.push('The database is that of DATABASE_URL; it has the people and vessels it has.');
  } else {
    lines.push('Demo sign-ins, all with the password  ' + secrets.demoPassword, '');
    for (const { name, email, role } of DEMO_PEOPLE) lines.push(`  ${email.padEnd(26)}${name}, ${role}`);
    lines.push('', `Mail that it sends can be read at  ${settings.address}/mailbox`);
  }
  lines.push('', `Data and log: ${dataFolder}`, 'Ctrl-C stops it.', '');
  console.log(lines.join('\n'));
}

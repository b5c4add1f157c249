import { readDemoSignIns } from './demo-sign-ins.mjs';

/** Where it is, who can sign in, and how to end it. */
export function printWelcome({ settings, database, demoFolder, dataFolder }) {
  const lines = ['', `Ampwright is ready at  ${settings.address}`, ''];
  if (database === undefined) {
    lines.push('The database is that of DATABASE_URL, with the people and vessels that are in it.');
  } else {
    lines.push('Demo sign-ins:');
    for (const { name, email, password, role, admin } of readDemoSignIns(demoFolder)) {
      lines.push(`  ${email.padEnd(26)}${password.padEnd(16)}${name}, ${role}${admin ? ' and shop admin' : ''}`);
    }
    if (!process.env.SMTP_URL) lines.push('', `Mail that it sends can be read at  ${settings.address}/mailbox`);
  }
  lines.push('', `Data and log: ${dataFolder}`, 'Ctrl-C stops it.', '');
  console.log(lines.join('\n'));
}

/**
 * One line a role, so that everybody can sign in to the demo at once.
 *
 * @param {readonly { role: string, email: string, password: string }[]} accounts
 * @returns {string}
 */
export function accountTable(accounts) {
  const wide = (key) => Math.max(...accounts.map((account) => account[key].length));
  const line = ({ role, email, password }) =>
    `    ${role.padEnd(wide('role'))}  ${email.padEnd(wide('email'))}  ${password}`;
  return ['  Demo accounts (role, e-mail, password):', ...accounts.map(line)].join('\n');
}

/** Says where the app is to be found and, while the demonstration is loaded, how to sign in. */
export async function announce(url) {
  const answer = await fetch(new URL('/api/health', url));
  const { demo } = await answer.json();
  console.log(`\nHoldwater is at ${url}`);
  if (demo?.length) {
    console.log('\nThe demonstration is loaded (everything in it is invented). Sign in as:');
    const width = Math.max(...demo.map((person) => person.email.length));
    for (const person of demo) {
      console.log(`  ${person.email.padEnd(width)}   ${person.passphrase}   (${person.role})`);
    }
  }
  console.log('\nStop it with Ctrl C.\n');
}

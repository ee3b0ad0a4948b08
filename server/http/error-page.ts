const words: Record<number, { title: string; text: string }> = {
  400: {
    title: 'This address cannot be read',
    text: 'Check it for a stray percent sign, or start from the first page.',
  },
  404: { title: 'There is nothing at this address', text: 'Check the address, or search for what you need.' },
};
const ourFault = {
  title: 'Something went wrong on our side',
  text: 'Try again in a moment. If it stays, report the request id below.',
};

/** A page that needs nothing else to be shown; used when the app itself cannot be. */
export function errorPage(status: number, requestId: string): string {
  const { title, text } = words[status] ?? (status < 500 ? words[400]! : ourFault);
  return `<!doctype html>
<html lang="en">
  <head>
    <meta charset="utf-8">
    <title>${title} – Shimlore</title>
    <meta name="viewport" content="width=device-width, initial-scale=1">
    <style>body{font:1.1rem/1.5 sans-serif;color:#16263a;background:#fdfdfa;max-width:36em;margin:12vh auto;padding:0 1.2em}a{color:#1f4e8c}code{font-size:.9em}</style>
  </head>
  <body>
    <main>
      <h1>${title}</h1>
      <p>${text}</p>
      <p><a href="/">To the search</a></p>
      <p>Request id: <code>${requestId}</code></p>
    </main>
  </body>
</html>
`;
}

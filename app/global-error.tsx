'use client';

import './globals.css';

/** The last resort: it replaces the layout itself, so it leans on nothing but the style sheet. */
export default function GlobalError({ reset }: { error: Error & { digest?: string }; reset: () => void }) {
  return (
    <html lang="en">
      <head>
        <title>Evenohm could not draw this page</title>
      </head>
      <body>
        <main>
          <h1>Evenohm could not draw this page</h1>
          <p className="quiet">What is recorded is untouched. The server’s log says what happened.</p>
          <p>
            <button type="button" onClick={reset}>
              Try again
            </button>
          </p>
        </main>
      </body>
    </html>
  );
}

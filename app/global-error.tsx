'use client';

/** The last resort, where even the frame of the page failed. */
export default function GlobalError() {
  return (
    <html lang="en">
      <body>
        <main id="main">
          <h1>Aftercut is out of order just now</h1>
          <p>
            The fault is ours. What you typed stays on this device. Wait a minute, then load the page again.
          </p>
          <p>
            <a href="">Load again</a>
          </p>
        </main>
      </body>
    </html>
  );
}

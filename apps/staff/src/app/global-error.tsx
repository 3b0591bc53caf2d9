"use client";

export default function GlobalError({ error }: { error: Error & { digest?: string } }) {
  return (
    <html lang="en-GB">
      <body>
        <title>Something went wrong: Withy</title>
        <main>
          <h1>Something went wrong on our side</h1>
          <p>
            Nothing was changed. Reload the page. If it stays, tell whoever looks after Withy this number:{" "}
            {error.digest ?? "none"}.
          </p>
        </main>
      </body>
    </html>
  );
}

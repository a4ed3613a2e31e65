"use client";
import { Key } from "@/components/ui/Key";
import { Notice } from "@/components/ui/Notice";

/** A fault of ours: what happened, what is kept, one key. The digest is what the server's log calls it. */
export default function ErrorPage({ error, reset }: { error: Error & { digest?: string }; reset: () => void }) {
  return (
    <main id="content" className="page py-14">
      <h1 className="mb-6 text-h1">This page could not be shown</h1>
      <Notice
        tone="minus"
        fact="The server met a fault."
        reference={error.digest}
        live
        action={
          <Key size="small" onClick={reset}>
            Try again
          </Key>
        }
      >
        Nothing that was saved is lost.
      </Notice>
    </main>
  );
}

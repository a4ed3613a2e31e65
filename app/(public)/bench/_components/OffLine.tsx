"use client";
import { useSyncExternalStore } from "react";
import { Glyph } from "@/components/ui/Glyph";

/** Says so while the browser has no network. */
export function OffLine() {
  const online = useSyncExternalStore(
    subscribe,
    () => navigator.onLine,
    () => true,
  );
  return (
    <p role="status" className="text-dense">
      {!online && (
        <span className="mb-4 flex items-center gap-3">
          <Glyph name="suspended" size={20} className="flex-none" />
          <span>
            <strong>Off line.</strong> The bench works as it is kept on this device.
          </span>
        </span>
      )}
    </p>
  );
}

function subscribe(listener: () => void): () => void {
  window.addEventListener("online", listener);
  window.addEventListener("offline", listener);
  return () => {
    window.removeEventListener("online", listener);
    window.removeEventListener("offline", listener);
  };
}

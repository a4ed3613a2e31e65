/** A cap in a line of help: the name of a key of the keyboard. */
export function KeyCap({ children }: { children: string }) {
  return <kbd className="keycap">{children}</kbd>;
}

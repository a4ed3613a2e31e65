import Link from "next/link";
import type { ComponentProps } from "react";
import { keyClass, type KeyLook } from "./keyClass";

/** A link that looks like a key, for going somewhere; `download` and outside addresses use a plain anchor. */
export function LinkKey({
  variant,
  size,
  wide,
  className,
  href,
  ...rest
}: ComponentProps<"a"> & KeyLook & { href: string }) {
  const look = keyClass({ variant, size, wide }, className);
  if (rest.download !== undefined || /^[a-z]+:|^\/api\//.test(href))
    return <a {...rest} href={href} className={look} />;
  return <Link {...rest} href={href} className={look} />;
}

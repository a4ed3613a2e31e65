"use client";
import type { AnchorHTMLAttributes, MouseEvent } from "react";
import { benchHref, goTo } from "./benchAddress";

type BenchLinkProps = Omit<AnchorHTMLAttributes<HTMLAnchorElement>, "href" | "onClick" | "id"> & { id: string | null };

/** A link within the bench: needs no server, so that it works off line; opened in a new tab it is a link like any other. */
export function BenchLink({ id, ...rest }: BenchLinkProps) {
  const follow = (event: MouseEvent) => {
    if (event.metaKey || event.ctrlKey || event.shiftKey || event.altKey) return;
    event.preventDefault();
    goTo(id);
    // The heading of what has opened, once it stands.
    requestAnimationFrame(() => {
      document.getElementById(id === null ? "bench" : "open-calculator")?.focus();
      window.scrollTo(0, 0);
    });
  };
  return <a {...rest} href={benchHref(id)} onClick={follow} />;
}

import { useId, type ButtonHTMLAttributes, type ReactNode } from "react";
import { classNames } from "./classNames";
import { keyClass, type KeyLook } from "./keyClass";

export type KeyProps = Omit<ButtonHTMLAttributes<HTMLButtonElement>, "disabled"> &
  KeyLook & {
    children: ReactNode;
    /** Why the key cannot be pressed now; while it is given, the key is focusable, inert and says so beside it. */
    reason?: string | null;
    busy?: boolean;
  };

/** A key: verb and object, with the value where there is one. One filled key per view. */
export function Key({
  variant,
  size,
  wide,
  reason,
  busy,
  className,
  type = "button",
  onClick,
  children,
  ...rest
}: KeyProps) {
  const reasonId = useId();
  const inert = Boolean(reason) || Boolean(busy);
  const key = (
    <button
      {...rest}
      // An inert submit key must not send the form when Enter is pressed in a field either.
      type={inert ? "button" : type}
      className={keyClass({ variant, size, wide }, className)}
      aria-disabled={inert || undefined}
      aria-busy={busy || undefined}
      aria-describedby={reason ? reasonId : rest["aria-describedby"]}
      onClick={inert ? undefined : onClick}
    >
      {children}
    </button>
  );
  // A key that may have a reason stays in one place of the tree, so that a press is not lost when the reason goes.
  if (reason === undefined) return key;
  return (
    <span className={classNames(wide ? "flex" : "inline-flex", "flex-wrap items-center gap-x-3 gap-y-1")}>
      {key}
      {reason && (
        <span id={reasonId} className="key-reason">
          {reason}
        </span>
      )}
    </span>
  );
}

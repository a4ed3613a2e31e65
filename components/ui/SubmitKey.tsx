"use client";
import { useFormStatus } from "react-dom";
import { Key, type KeyProps } from "./Key";

/** The key that sends its form; while the form is on its way it cannot be pressed twice. */
export function SubmitKey(props: KeyProps) {
  const { pending } = useFormStatus();
  return <Key variant="filled" {...props} type="submit" busy={pending || props.busy} />;
}

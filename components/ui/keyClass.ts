import { classNames } from "./classNames";

export type KeyLook = {
  /** One filled key per view; `cut` is outlined and opens a dialog, `cut-filled` stands in that dialog only. */
  variant?: "filled" | "plain" | "cut" | "cut-filled";
  /** large 56 px, normal 44 px; small 36 px and tiny 28 px under a fine pointer only, 44 px on touch. */
  size?: "large" | "normal" | "small" | "tiny";
  wide?: boolean;
};

export const keyClass = ({ variant = "plain", size = "normal", wide }: KeyLook, more?: string) =>
  classNames(
    "key",
    variant !== "plain" && `key-${variant}`,
    size !== "normal" && `key-${size}`,
    wide && "w-full",
    more,
  );

// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { Dialog } from "@/components/ui/Dialog";
import { Key } from "@/components/ui/Key";

beforeEach(() => {
  // jsdom has the element but not its methods.
  HTMLDialogElement.prototype.showModal = function () {
    this.open = true;
  };
  HTMLDialogElement.prototype.close = function () {
    this.open = false;
  };
});
afterEach(cleanup);

const dialog = (open: boolean, onClose: () => void) => (
  <Dialog
    open={open}
    onClose={onClose}
    title="Withdraw the certificate?"
    safe={<Key>Keep it</Key>}
    act={<Key variant="cut-filled">Withdraw</Key>}
  >
    It will read Withdrawn everywhere.
  </Dialog>
);

test("opens and closes as asked, and is named by its title", () => {
  const { rerender } = render(dialog(true, vi.fn()));
  expect(screen.getByRole<HTMLDialogElement>("dialog", { name: "Withdraw the certificate?" }).open).toBe(true);
  rerender(dialog(false, vi.fn()));
  expect(document.querySelector("dialog")!.open).toBe(false);
});

test("Escape is the safe key: it asks to close and does not act", () => {
  const closed = vi.fn();
  render(dialog(true, closed));
  fireEvent(screen.getByRole("dialog"), new Event("cancel", { cancelable: true }));
  expect(closed).toHaveBeenCalledTimes(1);
});

test("the safe key stands first, the one that acts last", () => {
  render(dialog(true, vi.fn()));
  expect(screen.getAllByRole("button").map((key) => key.textContent)).toEqual(["Keep it", "Withdraw"]);
});

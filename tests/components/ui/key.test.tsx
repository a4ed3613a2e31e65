// @vitest-environment jsdom
import { cleanup, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, expect, test, vi } from "vitest";
import { Key } from "@/components/ui/Key";
import { LinkKey } from "@/components/ui/LinkKey";

afterEach(cleanup);

test("a key that cannot be pressed stays focusable, says why and does nothing", async () => {
  const pressed = vi.fn();
  render(
    <Key reason="1 error to fix first" onClick={pressed}>
      Release 3.3
    </Key>,
  );
  const key = screen.getByRole("button", { name: "Release 3.3" });
  await userEvent.tab();
  expect(document.activeElement).toBe(key);
  expect(key.getAttribute("aria-disabled")).toBe("true");
  expect(document.getElementById(key.getAttribute("aria-describedby")!)!.textContent).toBe("1 error to fix first");
  await userEvent.click(key);
  await userEvent.keyboard("{Enter} ");
  expect(pressed).not.toHaveBeenCalled();
});

test("a submit key with a reason does not send its form, without one it does", async () => {
  const sent = vi.fn((event: React.FormEvent) => event.preventDefault());
  const form = (reason: string | null) => (
    <form onSubmit={sent}>
      <input aria-label="Number" />
      <Key type="submit" reason={reason}>
        Hand in
      </Key>
    </form>
  );
  const { rerender } = render(form("4 quantities are empty"));
  await userEvent.click(screen.getByRole("button"));
  await userEvent.type(screen.getByLabelText("Number"), "1");
  expect(sent).not.toHaveBeenCalled();
  rerender(form(null));
  await userEvent.click(screen.getByRole("button"));
  expect(sent).toHaveBeenCalledTimes(1);
});

test("while busy it cannot be pressed twice", async () => {
  const pressed = vi.fn();
  render(
    <Key busy onClick={pressed}>
      Sign
    </Key>,
  );
  await userEvent.click(screen.getByRole("button"));
  expect(pressed).not.toHaveBeenCalled();
  expect(screen.getByRole("button").getAttribute("aria-busy")).toBe("true");
});

test("a key that leads somewhere is a link", () => {
  render(<LinkKey href="/prices">Prices</LinkKey>);
  expect(screen.getByRole("link", { name: "Prices" }).getAttribute("href")).toBe("/prices");
});

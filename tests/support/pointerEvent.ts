/** jsdom has no pointer events: a mouse event that also says which kind of pointer it was. */
class PointerEventOfTests extends MouseEvent {
  readonly pointerType: string;
  readonly pointerId: number;

  constructor(type: string, init: PointerEventInit = {}) {
    super(type, init);
    this.pointerType = init.pointerType ?? "mouse";
    this.pointerId = init.pointerId ?? 1;
  }
}

export function installPointerEvent(): void {
  if (!("PointerEvent" in window)) Object.defineProperty(window, "PointerEvent", { value: PointerEventOfTests });
}

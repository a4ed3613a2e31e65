/** The mark: a sharp peak on a three-level floor. `one-colour` for print and ink grounds. */
export function Mark({ size = 30, tone = "colours" }: { size?: number; tone?: "colours" | "one-colour" }) {
  const paint = (colour: string) => (tone === "colours" ? `var(--${colour})` : "currentColor");
  return (
    <svg width={size} height={size} viewBox="0 0 32 32" aria-hidden className="block flex-none">
      <path d="M10.4 20.6L16 0l5.6 20.6z" fill={paint("plus")} />
      <path d="M1.5 14.4h6.6v6.2H1.5z" fill={paint("plus")} />
      <path d="M23.9 23.8h6.6V30h-6.6z" fill={paint("minus")} />
      <path d="M0 20.6h32v3.2H0z" fill={paint("ink")} />
    </svg>
  );
}

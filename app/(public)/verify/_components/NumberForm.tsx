import { Field } from "@/components/ui/Field";
import { Key } from "@/components/ui/Key";

/** Type the number; the answer has an address of its own, the one in the QR code. Works without script. */
export function NumberForm({ value, error }: { value?: string; error?: string | null }) {
  return (
    <form action="/verify" method="get" className="grid gap-4">
      <Field
        name="number"
        label="Certificate number"
        look="code"
        defaultValue={value}
        error={error}
        placeholder="LM-XXXXX-XXXXX-X"
        autoComplete="off"
        autoCapitalize="characters"
        spellCheck={false}
        maxLength={64}
        help="On the certificate under the mark. Spaces, dashes and small letters do not matter."
        required
      />
      <div>
        <Key type="submit" variant="filled">
          Verify this number
        </Key>
      </div>
    </form>
  );
}

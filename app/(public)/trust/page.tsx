import { TrustedText, trustedText } from "@/components/site/TrustedText";

export async function generateMetadata() {
  const { title, description } = (await trustedText("trust")).frontmatter;
  return { title, description };
}

export default function TrustPage() {
  return <TrustedText name="trust" />;
}

import { TrustedText, trustedText } from "@/components/site/TrustedText";

export async function generateMetadata() {
  const { title, description } = (await trustedText("cautions")).frontmatter;
  return { title, description };
}

export default function CautionsPage() {
  return <TrustedText name="cautions" />;
}

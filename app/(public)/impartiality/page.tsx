import { TrustedText, trustedText } from "@/components/site/TrustedText";

export async function generateMetadata() {
  const { title, description } = (await trustedText("impartiality")).frontmatter;
  return { title, description };
}

export default function ImpartialityPage() {
  return <TrustedText name="impartiality" />;
}

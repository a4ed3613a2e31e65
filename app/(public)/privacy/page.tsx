import { TrustedText, trustedText } from "@/components/site/TrustedText";

export async function generateMetadata() {
  const { title, description } = (await trustedText("privacy")).frontmatter;
  return { title, description };
}

export default function PrivacyPage() {
  return <TrustedText name="privacy" />;
}

export default function LandingPage() {
  return <h1 className="page py-10 text-display">A certificate that shows its working</h1>;
}

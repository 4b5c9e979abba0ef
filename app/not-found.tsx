import Link from "next/link";

export default function NotFound() {
  return (
    <main className="mx-auto max-w-xl px-6 py-24">
      <h1 className="text-3xl">Nothing is charted here</h1>
      <p className="mt-3 text-ink-soft">The page does not exist, or it belongs to another team.</p>
      <Link href="/" className="mt-6 inline-block text-deep underline">
        Back to the overview
      </Link>
    </main>
  );
}

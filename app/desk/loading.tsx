export default function Loading() {
  return (
    <p className="text-xl text-soft" role="status">
      Fetching it …
    </p>
  );
}

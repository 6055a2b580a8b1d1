export default function Safety() {
  return <h1>Safety first</h1>;
}

export default function Home() {
  return <h1>Keypeg</h1>;
}

// Local stand-ins for the object store and the mail server, on loopback, in one process.
// node scripts/stand-ins.mjs <folder> <bucket> <s3 port> <smtp port> <mail page port>
import { mkdirSync } from "node:fs";
import MailDev from "maildev";
import S3rver from "s3rver";

const [folder, bucket, s3Port, smtpPort, mailPort] = process.argv.slice(2);
mkdirSync(folder, { recursive: true });

const store = new S3rver({
  address: "127.0.0.1",
  port: Number(s3Port),
  silent: true,
  directory: folder,
  configureBuckets: [{ name: bucket }],
});
await store.run();

const mail = new MailDev({
  smtp: Number(smtpPort),
  web: Number(mailPort),
  ip: "127.0.0.1",
  webIp: "127.0.0.1",
  silent: true,
});
mail.listen((error) => {
  if (error) throw error;
});

const parent = process.ppid;
setInterval(() => {
  if (process.ppid !== parent) process.exit(0);
}, 1000);

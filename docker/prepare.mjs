import { migrate } from "../scripts/local/demo.mjs";
import { giveUp, step } from "../scripts/local/say.mjs";
import { ensureBucket } from "../scripts/local/store.mjs";

/* Before the application starts in a deployment: the newest migrations, and the private bucket. */
const { S3_ENDPOINT, S3_REGION, S3_ACCESS_KEY, S3_SECRET_KEY, S3_BUCKET } = process.env;
try {
  await step("Migrations", () => migrate({}));
  const store = {
    endpoint: S3_ENDPOINT,
    region: S3_REGION,
    accessKey: S3_ACCESS_KEY,
    secretKey: S3_SECRET_KEY,
    bucket: S3_BUCKET,
  };
  await step("Bucket", async () => ((await ensureBucket(store)) ? "made" : "there already"));
} catch (error) {
  giveUp(error);
}

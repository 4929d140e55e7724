/**
 * Makes the bucket and proves that the store keeps what it is given.
 * @param {Record<string, string>} env the product's environment
 */
export async function ensureBucket(env) {
  process.env.AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED = 'true';
  // Loaded here, not above: the first lines of a start run before npm has installed anything.
  const { S3Client, CreateBucketCommand, PutObjectCommand, DeleteObjectCommand } = await import('@aws-sdk/client-s3');
  const client = new S3Client({
    endpoint: env.STORAGE_ENDPOINT,
    region: env.STORAGE_REGION,
    forcePathStyle: true,
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
    credentials: { accessKeyId: env.STORAGE_ACCESS_KEY, secretAccessKey: env.STORAGE_SECRET_KEY },
  });
  const Bucket = env.STORAGE_BUCKET;
  try {
    await client.send(new CreateBucketCommand({ Bucket }));
  } catch (error) {
    const name = error instanceof Error ? error.name : '';
    if (name !== 'BucketAlreadyOwnedByYou' && name !== 'BucketAlreadyExists') throw error;
  }
  try {
    await client.send(new PutObjectCommand({ Bucket, Key: 'start-check', Body: 'kept' }));
    await client.send(new DeleteObjectCommand({ Bucket, Key: 'start-check' }));
  } catch (error) {
    const hint = 'The object store cannot keep a file. Its disk must allow user extended attributes (ext4 and xfs do).';
    throw new Error(hint, { cause: error });
  } finally {
    client.destroy();
  }
}

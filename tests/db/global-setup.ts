import type { TestProject } from "vitest/node";
import { joinTestCluster } from "@/scripts/test-cluster.mjs";
import { dropLeftovers, migratedTemplate } from "@/scripts/test-templates";

declare module "vitest" {
  interface ProvidedContext {
    /** An administrative database in the cluster of the tests. */
    clusterUrl: string;
    /** The database with every migration and no row, from which each test file gets a copy. */
    migratedTemplate: string;
  }
}

/** Starts PostgreSQL and migrates the template once for all test files. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const cluster = await joinTestCluster();
  await dropLeftovers(cluster.url);
  project.provide("clusterUrl", cluster.url);
  project.provide("migratedTemplate", await migratedTemplate(cluster.url));
  return cluster.leave;
}

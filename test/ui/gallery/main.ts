import { mount, type Component } from 'svelte';
import '../../../src/app.css';
import BatchPage from './batch-page.svelte';
import BenchPage from './bench-page.svelte';
import PartsPage from './parts-page.svelte';
import PicturesPage from './pictures-page.svelte';

const pages: Readonly<Record<string, Component<{ scene: string }>>> = {
  bench: BenchPage,
  batch: BatchPage,
  parts: PartsPage,
  pictures: PicturesPage,
};
const asked = new URLSearchParams(location.search);
document.documentElement.dataset.theme = asked.get('theme') ?? 'light';
mount(pages[asked.get('page') ?? 'bench'] ?? BenchPage, {
  target: document.body,
  props: { scene: asked.get('scene') ?? '' },
});

/**
 * What this browser can draw with. WebGL may be missing or switched off, and where it is there it may be a program on the
 * processor, which is slower than no WebGL at all. `failIfMajorPerformanceCaveat` does not tell, the name of the renderer does.
 */

export type Capability = 'none' | 'software' | 'gpu';

const softwareRenderers = /swiftshader|llvmpipe|softpipe|software|basic render|warp|svga3d|virgl/i;

/** From the renderer's own name. A masked or empty name is taken for software: that way is right everywhere, only slower. */
export function capabilityOf(renderer: string | null): Capability {
  if (renderer === null || renderer === '' || /^(webkit )?webgl$/i.test(renderer)) return 'software';
  return softwareRenderers.test(renderer) ? 'software' : 'gpu';
}

let detected: Capability | undefined;

/** Asked once a page: makes a throw-away WebGL 2 context and lets it go at once. */
export function detectCapability(): Capability {
  detected ??= probe();
  return detected;
}

function probe(): Capability {
  const context = document.createElement('canvas').getContext('webgl2');
  if (!context) return 'none';
  const names = context.getExtension('WEBGL_debug_renderer_info');
  const renderer: unknown = names ? context.getParameter(names.UNMASKED_RENDERER_WEBGL) : null;
  context.getExtension('WEBGL_lose_context')?.loseContext();
  return capabilityOf(typeof renderer === 'string' ? renderer : null);
}

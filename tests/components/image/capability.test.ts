/** Names of renderers as browsers report them in UNMASKED_RENDERER_WEBGL (common practice; seen on the machines named). */
import { capabilityOf } from '@/components/image/capability';

describe('the capability of a browser', () => {
  it.each([
    'ANGLE (Google, Vulkan 1.3.0 (SwiftShader Device (Subzero) (0x0000C0DE)), SwiftShader driver)',
    'llvmpipe (LLVM 15.0.6, 256 bits)',
    'ANGLE (Microsoft, Microsoft Basic Render Driver Direct3D11)',
    'SVGA3D; build: RELEASE',
  ])('is software where WebGL runs on the processor: %s', (renderer) => {
    expect(capabilityOf(renderer)).toBe('software');
  });

  it('is a GPU where the renderer is one', () => {
    expect(capabilityOf('ANGLE (Intel, Mesa Intel(R) UHD Graphics 620, OpenGL 4.6)')).toBe('gpu');
  });

  it('is taken for software where the browser hides the name', () => {
    expect(capabilityOf(null)).toBe('software');
    expect(capabilityOf('WebKit WebGL')).toBe('software');
  });
});

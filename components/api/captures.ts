/** Secondary captures: whoever sent one says, after looking, that it shows no text, or takes it away. */
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { confirmNoText, discardImage } from '@/server/contract/images';
import { call } from './call';
import { imageKey } from './images';

export function useConfirmNoText(imageId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call(confirmNoText, { params: { imageId }, body: { confirmedNoText: true } }),
    onSuccess: (image) => client.setQueryData(imageKey(imageId), image),
  });
}

export const useDiscardImage = (imageId: string) => useMutation({ mutationFn: () => call(discardImage, { params: { imageId } }) });

/// Reference values: what the first answer is compared with, as stated, in closed form or by quadrature, each with its
/// error. Start with [ReferenceValue][dev.leadline.reference.ReferenceValue].
package dev.leadline.reference;
